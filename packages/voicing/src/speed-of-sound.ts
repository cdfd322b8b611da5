import {
  cramerSpeed,
  isWithinCramerRange,
  sonicTemperatureSpeed,
  STANDARD_PRESSURE_PA,
  type HumidAir,
} from './humid-air.js';
import { centsBetween } from './notes.js';
import { within } from './number-checks.js';
import { dryAirSpeed, SPEED_FORMULAS } from './speed-formulas.js';
import type { UncertaintyTerm } from './uncertainty.js';
import type { Room } from './voice.js';
import { VoicingError } from './voicing-error.js';

/** The air of a room: its speed of sound, what makes that unsure, and what to tell the reader about it. */
export type Air = { speedMS: number; terms: UncertaintyTerm[]; warnings: string[] };

export type AirInput = Pick<Room, 'temperatureC' | 'relativeHumidity' | 'pressurePa'>;

/**
 * Speed of sound in the air of a room, m/s.
 * With a humidity (0..1): Cramer 1993 at the pressure given (101 325 Pa where not), 0..30 °C, 75..102 kPa.
 * Without: the dry-air root form, −20..50 °C, whatever the pressure (an ideal gas does not mind it).
 * Moist air is faster: 0.8 m/s (4 cents) at 20 °C and half humidity.
 * @throws VoicingError `out-of-range` outside the formula's range, `bad-number`
 */
export function speedOfSound(input: AirInput): number {
  const humid = checkedAir(input);
  if (humid === undefined) return dryAirSpeed(input.temperatureC);
  if (!isWithinCramerRange(humid)) {
    throw new VoicingError(
      'out-of-range',
      `The humid-air formula holds for 0 to 30 °C and 75 to 102 kPa, not ${humid.temperatureC} °C and ` +
        `${humid.pressurePa / 1000} kPa: leave the humidity out for the dry-air value.`,
      humid.temperatureC < 0 || humid.temperatureC > 30 ? 'temperatureC' : 'pressurePa',
    );
  }
  return cramerSpeed(humid);
}

/**
 * The air of a room for a prediction. Where `speedOfSound` refuses humid air for its range, this one goes on
 * with the sonic-temperature form and says so in `warnings`.
 * @throws VoicingError `out-of-range` outside −20..50 °C or 50..110 kPa, `bad-number`
 */
export function airIn(room: AirInput): Air {
  const humid = checkedAir(room);
  const warnings: string[] = [];
  let speedMS = dryAirSpeed(room.temperatureC);
  if (humid !== undefined && isWithinCramerRange(humid)) {
    speedMS = cramerSpeed(humid);
  } else if (humid !== undefined) {
    speedMS = sonicTemperatureSpeed(humid);
    warnings.push(
      `At ${humid.temperatureC} °C and ${humid.pressurePa / 1000} kPa the humid-air formula does not hold ` +
        '(0 to 30 °C, 75 to 102 kPa); a coarser one was used.',
    );
  }
  return { speedMS, warnings, terms: airTerms(room, speedMS, humid) };
}

function checkedAir({ temperatureC, relativeHumidity, pressurePa }: AirInput): HumidAir | undefined {
  within(temperatureC, -20, 50, 'temperatureC', 'give the temperature of the room in °C.');
  if (pressurePa !== undefined) {
    within(
      pressurePa,
      50_000,
      110_000,
      'pressurePa',
      'give the air pressure in pascals (1013 hPa is 101300).',
    );
  }
  if (relativeHumidity === undefined) return undefined;
  within(relativeHumidity, 0, 1, 'relativeHumidity', 'give it from 0 to 1 (0.5 is 50 %).');
  return { temperatureC, relativeHumidity, pressurePa: pressurePa ?? STANDARD_PRESSURE_PA };
}

function airTerms(room: AirInput, speedMS: number, humid: HumidAir | undefined): UncertaintyTerm[] {
  const { temperatureC } = room;
  const dryMS = dryAirSpeed(temperatureC);
  const opinions = Object.values(SPEED_FORMULAS).filter(
    ({ isRounded, lowC, highC }) => !isRounded && temperatureC >= lowC && temperatureC <= highC,
  );
  const spread = Math.max(...opinions.map(({ at }) => Math.abs(centsBetween(at(temperatureC), dryMS))));
  const terms: UncertaintyTerm[] = [
    { from: 'the published formulas for the speed of sound differ', cents: Math.max(1, spread) },
    { from: 'the thermometer, by 1 °C', cents: centsBetween(dryAirSpeed(temperatureC + 1), dryMS) },
  ];
  if (humid === undefined) {
    const soaked = { temperatureC, relativeHumidity: 1, pressurePa: room.pressurePa ?? STANDARD_PRESSURE_PA };
    terms.push({
      from: 'the humidity is not known',
      cents: centsBetween(sonicTemperatureSpeed(soaked), speedMS),
    });
  } else if (!isWithinCramerRange(humid)) {
    terms.push({ from: 'the humid-air formula is outside its range', cents: 5 });
  }
  return terms;
}
