import { dryAirSpeed } from './speed-formulas.js';

/** The atmosphere at sea level (ISO 2533), in Pa. */
export const STANDARD_PRESSURE_PA = 101_325;

/** Mole fraction of carbon dioxide in air; 0.1 % more of it lowers a pitch by half a cent. */
const CO2_MOLE_FRACTION = 0.0004;

export type HumidAir = { temperatureC: number; relativeHumidity: number; pressurePa: number };

/** Whether Cramer's equation was made for this air: 0..30 °C and 75..102 kPa. */
export function isWithinCramerRange({ temperatureC, pressurePa }: HumidAir): boolean {
  return temperatureC >= 0 && temperatureC <= 30 && pressurePa >= 75_000 && pressurePa <= 102_000;
}

/**
 * Speed of sound in humid air at low frequency.
 * Source: O. Cramer, J. Acoust. Soc. Am. 93(5), 2510–2516 (1993), equation 15; 0.0004 of carbon dioxide.
 * Assumes real gas, 0..30 °C, 75..102 kPa, water vapour under 0.06; its own error is 300 parts in a million
 * (half a cent). The caller checks the range with `isWithinCramerRange`.
 * @returns m/s
 */
export function cramerSpeed(air: HumidAir): number {
  const t = air.temperatureC;
  const p = air.pressurePa;
  const xw = waterMoleFraction(air);
  const xc = CO2_MOLE_FRACTION;
  return (
    331.5024 +
    0.603055 * t -
    0.000528 * t ** 2 +
    (51.471935 + 0.1495874 * t - 0.000782 * t ** 2) * xw +
    (-1.82e-7 + 3.73e-8 * t - 2.93e-10 * t ** 2) * p +
    (-85.20931 - 0.228525 * t + 5.91e-5 * t ** 2) * xc -
    2.835149 * xw ** 2 -
    2.15e-13 * p ** 2 +
    29.179762 * xc ** 2 +
    0.000486 * xw * p * xc
  );
}

/**
 * Speed of sound in humid air outside Cramer's range: the dry-air root with the sonic temperature
 * `T (1 + 0.32 e / p)`, e being the vapour pressure.
 * Source: J. C. Kaimal & J. E. Gaynor, Boundary-Layer Meteorol. 56, 401–410 (1991) (from memory).
 * Agrees with Cramer within 1 cent where both hold. Predictions that use it carry a warning.
 * @returns m/s
 */
export function sonicTemperatureSpeed(air: HumidAir): number {
  return dryAirSpeed(air.temperatureC) * Math.sqrt(1 + 0.32 * waterMoleFraction(air));
}

/**
 * Mole fraction of water vapour. Source: R. S. Davis, Metrologia 29, 67–70 (1992): saturation vapour
 * pressure and enhancement factor of the equation CIPM-81/91.
 */
function waterMoleFraction({ temperatureC, relativeHumidity, pressurePa }: HumidAir): number {
  const kelvin = temperatureC + 273.15;
  const enhancement = 1.00062 + 3.14e-8 * pressurePa + 5.6e-7 * temperatureC ** 2;
  const saturationPa = Math.exp(
    1.2378847e-5 * kelvin ** 2 - 1.9121316e-2 * kelvin + 33.93711047 - 6343.1645 / kelvin,
  );
  return (relativeHumidity * enhancement * saturationPa) / pressurePa;
}
