import type { RankVoice } from '@windchest/contracts';
import { ballDiameterMm, drawnVoices, noteLetter, noteName } from './drawn-voices.js';

describe('the voices of a kit as they are drawn', () => {
  it('a pipe is as wide as its bore and both walls', () => {
    const pipe: RankVoice = {
      code: 'P-73',
      voice: { kind: 'stopped-pipe', note: 'C#5', lengthMm: 150.98, boreMm: 11, wallMm: 1.6 },
    };
    const [drawn] = drawnVoices([pipe]);
    expect(drawn).toMatchObject({ key: 'P-73', label: 'C♯', kind: 'stopped-pipe', lengthMm: 150.98 });
    expect(drawn?.widthMm).toBeCloseTo(14.2, 9);
  });

  it('a bar has the width written down, else one in keeping with its thickness', () => {
    const bar = {
      kind: 'free-bar' as const,
      note: 'C5',
      lengthMm: 98,
      thicknessMm: 4,
      youngsModulusGPa: 2,
      densityKgM3: 1270,
    };
    const drawn = drawnVoices([
      { code: 'B-01', voice: { ...bar, widthMm: 20 } },
      { code: 'B-02', voice: bar },
    ]);
    expect(drawn.map((one) => one.widthMm)).toEqual([20, 16]);
  });

  // Volume of a ball of 10 mm diameter: π/6 · 10³ mm³ (textbook formula).
  it('a vessel is the ball that holds its air, with its wall around', () => {
    expect(ballDiameterMm(0.5235987756)).toBeCloseTo(10, 6);
    const [drawn] = drawnVoices([
      {
        code: 'V-77',
        voice: {
          kind: 'vessel',
          note: 'F5',
          volumeCm3: 0.5235987756,
          wallMm: 2,
          holes: [{ diameterMm: 6 }],
        },
      },
    ]);
    expect(drawn?.lengthMm).toBeCloseTo(14, 6);
    expect(drawn?.widthMm).toBe(drawn?.lengthMm);
  });

  it('notes are lettered with their proper signs', () => {
    expect(['C5', 'F#4', 'Bb3', 'G♯-1'].map(noteLetter)).toEqual(['C', 'F♯', 'B♭', 'G♯']);
    expect(['C5', 'F#4', 'Bb3'].map(noteName)).toEqual(['C5', 'F♯4', 'B♭3']);
  });
});
