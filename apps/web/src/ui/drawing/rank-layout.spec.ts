import { partsScale } from './parts-scale.js';
import { type DrawnVoice, extentOf, extentOfAll, layOutRank, scaleText } from './rank-layout.js';

const pipe = (key: string, lengthMm: number, widthMm = 14): DrawnVoice => ({
  key,
  label: key,
  kind: 'stopped-pipe',
  lengthMm,
  widthMm,
});
const rank = [pipe('C', 160), pipe('D', 142), pipe('E', 126)];

describe('layOutRank', () => {
  it('draws lengths and widths to one scale', () => {
    const { pxPerMm, voices } = layOutRank(rank, { widthPx: 1000, heightPx: 320 });
    expect(pxPerMm).toBe(2);
    expect(voices.map((voice) => voice.height)).toEqual([320, 284, 252]);
    expect(voices.map((voice) => voice.width)).toEqual([28, 28, 28]);
  });

  it('stands all voices on one line', () => {
    const { voices, heightPx } = layOutRank(rank, { widthPx: 400, heightPx: 320 });
    for (const voice of voices) expect(voice.y + voice.height).toBeCloseTo(heightPx, 9);
  });

  it('fits the narrower of width and height', () => {
    const narrow = layOutRank(rank, { widthPx: 50, heightPx: 320 });
    expect(narrow.widthPx).toBeCloseTo(50, 9);
    expect(narrow.heightPx).toBeLessThan(320);
  });

  it('gives every place along the rank to exactly one voice to press', () => {
    const { voices, widthPx } = layOutRank(rank, { widthPx: 400, heightPx: 320 });
    let x = 0;
    for (const voice of voices) {
      expect(voice.slotX).toBeCloseTo(x, 9);
      x += voice.slotWidth;
    }
    expect(x).toBeCloseTo(widthPx, 9);
  });

  it('keeps several ranks at one scale when given the room that holds them all', () => {
    const whistle = [pipe('G', 176)];
    const extent = extentOfAll([rank, whistle]);
    const scales = [rank, whistle].map(
      (one) => layOutRank(one, { widthPx: 200, heightPx: 104, extent }).pxPerMm,
    );
    expect(scales[0]).toBe(scales[1]);
    expect(layOutRank(whistle, { widthPx: 200, heightPx: 104, extent }).heightPx).toBeCloseTo(104, 9);
  });

  it('leaves fingers room between strings', () => {
    const strings = ['a', 'b'].map((key): DrawnVoice => ({ ...pipe(key, 300, 0.8), kind: 'string' }));
    expect(extentOf(strings).widthMm).toBe(20);
  });

  it('draws nothing for no voices', () => {
    expect(layOutRank([], { widthPx: 100, heightPx: 100 })).toMatchObject({
      pxPerMm: 0,
      voices: [],
      heightPx: 0,
    });
  });
});

describe('scaleText', () => {
  it('is 1 : 1 at 96 px to the inch (CSS Values and Units 4, absolute lengths)', () => {
    expect(scaleText(96 / 25.4)).toBe('1 : 1');
    expect(scaleText(96 / 25.4 / 2)).toBe('1 : 2');
    expect(scaleText((96 / 25.4) * 2)).toBe('2 : 1');
    expect(scaleText(0)).toBe('');
  });
});

describe('partsScale', () => {
  it('lets the tallest part fit the height and the widest the width', () => {
    const parts = [
      { widthMm: 14, heightMm: 160 },
      { widthMm: 240, heightMm: 16 },
    ];
    expect(partsScale(parts, { widthPx: 800, heightPx: 80 })).toBe(0.5);
    expect(partsScale(parts, { widthPx: 60, heightPx: 80 })).toBe(0.25);
  });
});
