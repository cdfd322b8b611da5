import { aBar, anOpenPipe, aStoppedPipe, aString, aTine, aVessel } from '../fixtures/voices.fixture.js';
import { holeForMm, lengthForMm } from './length-for.js';
import { noteToHz } from './notes.js';
import { predict } from './predict.js';
import { trimAdvice } from './trim.js';
import type { Room } from './voice.js';

const room: Room = { temperatureC: 20, relativeHumidity: 0.5 };
const lengthVoices = [
  { voice: aStoppedPipe, note: 'C5' },
  { voice: anOpenPipe, note: 'C5' },
  { voice: aBar, note: 'F6' },
  { voice: aTine, note: 'A3' },
  { voice: aString, note: 'E4' },
];

describe('what to do about a printed voice', () => {
  it.each(lengthVoices)(
    'trims a flat one ($voice.kind) to the length that sounds its note',
    ({ voice, note }) => {
      const rightMm = lengthForMm(voice, note, room);
      const long = { ...voice, lengthMm: rightMm * 1.03 };
      const advice = trimAdvice(long, predict(long, room).hz, note, room);
      expect(advice.action).toBe('trim');
      expect(advice.cents).toBeLessThan(0);
      expect(advice.mm).toBeCloseTo(rightMm * 0.03, 6);
    },
  );

  it.each(lengthVoices)(
    'reprints a sharp one ($voice.kind) as much longer as it is short',
    ({ voice, note }) => {
      const rightMm = lengthForMm(voice, note, room);
      const short = { ...voice, lengthMm: rightMm * 0.97 };
      const advice = trimAdvice(short, predict(short, room).hz, note, room);
      expect(advice.action).toBe('reprint-longer');
      expect(advice.cents).toBeGreaterThan(0);
      expect(advice.mm).toBeCloseTo(rightMm * 0.03, 6);
    },
  );

  it('files the widest hole of a flat vessel wider', () => {
    const rightMm = holeForMm(aVessel, 'A5', room);
    const narrow = { ...aVessel, holes: [{ diameterMm: rightMm - 0.6 }, { diameterMm: 8 }] };
    const advice = trimAdvice(narrow, predict(narrow, room).hz, 'A5', room);
    expect(advice).toMatchObject({ action: 'trim', dimension: 'hole-diameter' });
    expect(advice.mm).toBeCloseTo(0.6, 6);
  });

  it('takes a millimetre off for 11 cents on a stopped C5 pipe (0.5 mm is 5 cents, published guidance)', () => {
    const flatHz = noteToHz('C5') * 2 ** (-10 / 1200);
    const { mm } = trimAdvice(aStoppedPipe, flatHz, 'C5', room);
    expect(mm).toBeGreaterThan(0.85);
    expect(mm).toBeLessThan(1.05);
  });

  it('leaves what is near enough, or too little to file', () => {
    expect(trimAdvice(aStoppedPipe, noteToHz('C5') * 2 ** (4 / 1200), 'C5', room)).toMatchObject({
      action: 'leave',
      mm: 0,
    });
    expect(
      trimAdvice(aStoppedPipe, noteToHz('C5') * 2 ** (-4 / 1200), 'C5', room, { leaveWithinCents: 1 }).action,
    ).toBe('trim');
    expect(
      trimAdvice({ ...aTine, lengthMm: 8 }, noteToHz('A4') * 2 ** (-6 / 1200), 'A4', room),
    ).toMatchObject({ action: 'leave' });
  });

  it('judges a pipe heard in a cold room by what it will sound at the temperature it is made for', () => {
    const right = { ...aStoppedPipe, lengthMm: lengthForMm(aStoppedPipe, 'C5', room) };
    const cold = { ...room, temperatureC: 10 };
    const coldHz = predict(right, cold).hz;
    expect(trimAdvice(right, coldHz, 'C5', cold).action).toBe('trim');
    expect(trimAdvice(right, coldHz, 'C5', cold, { tunedAtC: 20 }).action).toBe('leave');
    expect(trimAdvice(aString, noteToHz('E4'), 'E4', cold, { tunedAtC: 20 }).cents).toBeCloseTo(0, 9);
  });

  it('refuses a pitch that is no pitch of this voice', () => {
    expect(() => trimAdvice(aStoppedPipe, 3 * noteToHz('C5'), 'C5', room)).toThrow(
      expect.objectContaining({ code: 'not-this-voice' }),
    );
    expect(() => trimAdvice(aStoppedPipe, 0, 'C5', room)).toThrow(
      expect.objectContaining({ code: 'bad-number' }),
    );
  });
});
