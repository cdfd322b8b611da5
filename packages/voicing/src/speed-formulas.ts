export type SpeedFormulaId = 'square-root' | 'iso-9613-1' | 'linear' | 'textbook-331';

/** One published form of the speed of sound in dry air, and the temperatures it is meant for. */
export type SpeedFormula = {
  source: string;
  lowC: number;
  highC: number;
  /** A form whose constants are rounded on purpose: of no use as a second opinion. */
  isRounded: boolean;
  /** m/s at a temperature in °C */
  at: (temperatureC: number) => number;
};

const ZERO_C_IN_K = 273.15;

/**
 * Speed of sound in dry air as an ideal gas, `331.3 × √(1 + t / 273.15)` m/s.
 * Assumes constant heat capacities and no water vapour; pressure drops out. Source: textbook form of the
 * ideal-gas law; meant for −20..50 °C (the range ISO 9613-1 gives its own, like form).
 */
export function dryAirSpeed(temperatureC: number): number {
  return 331.3 * Math.sqrt(1 + temperatureC / ZERO_C_IN_K);
}

/**
 * The published forms side by side. All but the rounded one agree within 0.46 m/s (2.3 cents) between 0 and 30 °C;
 * that disagreement is part of the uncertainty of every prediction in air.
 */
export const SPEED_FORMULAS: Readonly<Record<SpeedFormulaId, SpeedFormula>> = {
  'square-root': {
    source: 'c = 331.3 sqrt(1 + t/273.15), ideal gas, textbook form',
    lowC: -20,
    highC: 50,
    isRounded: false,
    at: dryAirSpeed,
  },
  'iso-9613-1': {
    source: 'ISO 9613-1:1993 formula (A.5), c = 343.2 sqrt(T/293.15) with T in kelvin, as quoted by others',
    lowC: -20,
    highC: 50,
    isRounded: false,
    at: (temperatureC) => 343.2 * Math.sqrt((temperatureC + ZERO_C_IN_K) / 293.15),
  },
  linear: {
    source: 'c = 331.3 + 0.606 t, textbook tangent at 0 °C',
    lowC: 0,
    highC: 30,
    isRounded: false,
    at: (temperatureC) => 331.3 + 0.606 * temperatureC,
  },
  'textbook-331': {
    source: 'c = 331 sqrt(1 + t/273), OpenStax, University Physics vol. 1, 17.2; about 1.5 cents low',
    lowC: -20,
    highC: 50,
    isRounded: true,
    at: (temperatureC) => 331 * Math.sqrt(1 + temperatureC / 273),
  },
};
