import fc from 'fast-check';
import { cramerSpeed, sonicTemperatureSpeed, STANDARD_PRESSURE_PA } from './humid-air.js';
import { centsBetween } from './notes.js';
import { airIn, speedOfSound } from './speed-of-sound.js';

describe('the speed of sound', () => {
  it('rises with temperature and with humidity', () => {
    const celsius = fc.double({ min: 0, max: 29, noNaN: true });
    const humidity = fc.double({ min: 0, max: 0.9, noNaN: true });
    fc.assert(
      fc.property(celsius, humidity, (temperatureC, relativeHumidity) => {
        const here = speedOfSound({ temperatureC, relativeHumidity });
        expect(speedOfSound({ temperatureC: temperatureC + 1, relativeHumidity })).toBeGreaterThan(here);
        expect(speedOfSound({ temperatureC, relativeHumidity: relativeHumidity + 0.1 })).toBeGreaterThan(
          here,
        );
      }),
    );
  });

  it('of dry air goes from -20 to 50 °C and no further', () => {
    // ISO 9613-1:1993 (A.5), as quoted by others: 343.2 sqrt(323.15/293.15) = 360.33 m/s.
    expect(speedOfSound({ temperatureC: 50 })).toBeCloseTo(360.33, 1);
    expect(() => speedOfSound({ temperatureC: 51 })).toThrow(/temperatureC is 51, outside -20 to 50/);
    expect(() => speedOfSound({ temperatureC: 293.15 })).toThrow(/in °C/);
    expect(() => speedOfSound({ temperatureC: Number.NaN })).toThrow(/must be a number/);
  });

  it('refuses a humidity in per cent, a pressure in hPa, and humid air outside its formula', () => {
    expect(() => speedOfSound({ temperatureC: 20, relativeHumidity: 50 })).toThrow(/0\.5 is 50 %/);
    expect(() => speedOfSound({ temperatureC: 20, pressurePa: 1013 })).toThrow(/pascals/);
    expect(() => speedOfSound({ temperatureC: 34, relativeHumidity: 0.5 })).toThrow(/0 to 30 °C/);
    expect(() => speedOfSound({ temperatureC: 20, relativeHumidity: 0.5, pressurePa: 70_000 })).toThrow(
      /70 kPa/,
    );
  });

  it('is flagged, and less sure, where a prediction goes on outside the humid-air formula', () => {
    const warm = airIn({ temperatureC: 34, relativeHumidity: 0.5 });
    expect(warm.warnings).toHaveLength(1);
    expect(warm.warnings[0]).toMatch(/34 °C/);
    expect(warm.terms.map(({ from }) => from)).toContain('the humid-air formula is outside its range');
    expect(airIn({ temperatureC: 24, relativeHumidity: 0.5 }).warnings).toEqual([]);
  });

  it('does not jump where the coarser humid form takes over', () => {
    const rim = { temperatureC: 30, relativeHumidity: 0.7, pressurePa: STANDARD_PRESSURE_PA };
    expect(Math.abs(centsBetween(sonicTemperatureSpeed(rim), cramerSpeed(rim)))).toBeLessThan(1);
  });

  it('is less sure while the humidity is not known', () => {
    const unknown = airIn({ temperatureC: 20 }).terms.find(({ from }) => from.includes('humidity'));
    // Cramer 1993: 5.7 cents from dry to 90 %, so some 6 to 7 to wet.
    expect(unknown?.cents).toBeGreaterThan(5);
    expect(unknown?.cents).toBeLessThan(8);
  });
});
