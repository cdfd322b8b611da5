import type { PrintSheetPart, PrintSpecification } from '@windchest/contracts';
import { readMesh, writeBinaryStl } from '@windchest/meshes';
import { footprintOf, PlatesError, profileOf } from '@windchest/plates';
import { filamentNeeds, hoursOf, piecesOn, usualFilament, weightOf } from './plan-figures.js';
import { certaintyWords, filamentNotes, summaryWords } from './plan-words.js';
import { workOutPlates } from './plates-work.js';

/** A box of these sides as the API hands it out. */
const boxPart = (
  code: string,
  [x, y, z]: [number, number, number],
  rest: Partial<PrintSheetPart> = {},
): PrintSheetPart => {
  const corner = (i: number): [number, number, number] => [i & 1 ? x : 0, i & 2 ? y : 0, i & 4 ? z : 0];
  const faces = [
    [0, 2, 3, 1],
    [4, 5, 7, 6],
    [0, 1, 5, 4],
    [2, 6, 7, 3],
    [0, 4, 6, 2],
    [1, 3, 7, 5],
  ] as const;
  const corners = faces.flatMap(([a, b, c, d]) => [a, b, c, a, c, d].flatMap(corner));
  const mesh = readMesh(writeBinaryStl(Float32Array.from(corners)), { fileName: 'box.stl' });
  return {
    code,
    name: `Part ${code}`,
    quantity: 1,
    orientation: 'may-turn',
    sizeMm: { x, y, z },
    heightMm: z,
    footprint: footprintOf(mesh),
    profile: profileOf(mesh),
    printSpec: null,
    isGauge: false,
    variants: [],
    ...rest,
  };
};
const spec: PrintSpecification = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 2,
  topLayers: 4,
  bottomLayers: 4,
  infill: 0.15,
  material: 'PLA',
  supports: 'none',
  remarks: '',
};
const tpu = { ...spec, material: 'TPU' };
const cube = boxPart('C-01', [20, 20, 20], { quantity: 10 });
const foot = boxPart('F-01', [20, 20, 20], { quantity: 2, printSpec: tpu });
const parts = [
  cube,
  foot,
  boxPart('L-01', [90, 10, 10]),
  boxPart('T-01', [10, 30, 110], { orientation: 'may-lie' }),
  boxPart('T-02', [104, 40, 5], { orientation: 'may-lie' }),
  boxPart('X-01', [120, 20, 20], { orientation: 'as-exported' }),
  boxPart('M-01', [98, 40, 4], { orientation: 'as-exported' }),
  boxPart('U-01', [5, 5, 5], { profile: null, footprint: null }),
];
const question = { parts, printSpec: spec, bed: { xMm: 100, yMm: 100, zMm: 105 }, gapMm: 5, marginMm: 5 };

describe('plates worked out for a printer', () => {
  const told: number[] = [];
  const answer = workOutPlates(question, (done) => told.push(done));
  const of = (code: string) => answer.parts.find((one) => one.code === code)!;

  it('tell of each part how it fits, by its own rule', () => {
    expect(of('C-01').fit.fit).toBe('fits');
    expect([of('T-01').fit.fit, of('T-01').isStood]).toEqual(['fits-laid', false]);
    expect([of('T-02').fit.fit, of('T-02').isStood]).toEqual(['fits-laid', true]);
    expect(of('X-01').fit).toEqual({ fit: 'too-big', overMm: { axis: 'x', mm: 20 } });
    expect(of('X-01').isKeptOffByMargin).toBe(false);
    expect([of('M-01').fit.fit, of('M-01').isKeptOffByMargin]).toEqual(['fits', true]);
  });

  it('hold every piece that goes on, and no other', () => {
    const pieces = Object.fromEntries(piecesOn(answer.plates).map(({ code, quantity }) => [code, quantity]));
    expect(pieces).toMatchObject({ 'C-01': 10, 'F-01': 2, 'L-01': 1, 'T-01': 1, 'U-01': 1 });
    expect(Object.keys(pieces)).not.toEqual(expect.arrayContaining(['X-01']));
    expect(pieces['M-01']).toBeUndefined();
    expect(told.at(-1)).toBe(1);
  });

  it('estimate what has a profile and settings that can be', () => {
    expect(of('U-01').estimate).toBeNull();
    const odd = workOutPlates({ ...question, parts: [{ ...cube, printSpec: { ...spec, layerMm: 0.5 } }] });
    expect(odd.parts[0]?.estimate).toBeNull();
    expect(of('C-01').estimate?.mayBeOffPercent).toBe(8);
  });

  it('are refused with a sentence where the margin leaves no room', () => {
    expect(() => workOutPlates({ ...question, marginMm: 50 })).toThrow(PlatesError);
  });

  describe('come to figures', () => {
    const estimates = new Map(
      answer.parts.flatMap(({ code, estimate }) => (estimate ? [[code, estimate]] : [])),
    );
    const pieces = [
      { code: 'C-01', quantity: 10, isLaid: false },
      { code: 'F-01', quantity: 2, isLaid: false },
    ];
    const card = [
      { material: 'PETG', pricePerKgMinor: 2500 },
      { material: 'pla', pricePerKgMinor: 2000 },
    ];
    const asked = { pieces, parts, estimates, printSpec: spec, card, chosen: {}, spoolG: 1000 };

    it('a slicer’s within 4 %: 3.57 g a cube (reference run: PrusaSlicer 2.5.0), at the price on the card', () => {
      const [pla, second] = filamentNeeds(asked);
      expect(Math.abs((pla?.weight?.massG ?? 0) / 35.665 - 1)).toBeLessThan(0.04);
      expect(pla).toMatchObject({ makers: 'PLA', printedIn: 'pla', isOnCard: true, spools: 1 });
      expect(pla?.costMinor).toBe(Math.round(((pla?.weight?.massG ?? 0) / 1000) * 2000));
      expect(second).toMatchObject({ makers: 'TPU', printedIn: 'TPU', isOnCard: false, costMinor: null });
    });

    it('of another filament, by its weight: grams follow the density, metres do not', () => {
      const [pla] = filamentNeeds(asked);
      const [petg] = filamentNeeds({ ...asked, chosen: { PLA: 'PETG' }, spoolG: 30 });
      expect((petg?.weight?.massG ?? 0) / (pla?.weight?.massG ?? 1)).toBeCloseTo(1.27 / 1.24, 9);
      expect(petg?.weight?.lengthM).toBeCloseTo(pla?.weight?.lengthM ?? 0, 9);
      expect(petg?.spools).toBe(2);
    });

    it('of a filament nobody knows, not at all', () => {
      const needs = filamentNeeds({ ...asked, chosen: { PLA: 'Reed-filled' } });
      expect(needs[0]).toMatchObject({ weight: null, spools: null, costMinor: null });
      expect(weightOf(1000, 'Reed-filled')).toBeNull();
      expect(filamentNotes(needs)).toEqual([
        expect.stringMatching(/What Reed-filled weighs is not known here.*Choose PLA/),
        expect.stringMatching(/TPU has no price/),
      ]);
      const summary = {
        plates: 1,
        partsOn: 2,
        partsInAll: 2,
        hours: { low: 3, high: 7 },
        needs,
        currency: 'EUR',
      };
      expect(summaryWords(summary)).toBe('1 plate, 3–7 h');
    });

    it('of hours, piece by piece, leaving out what has no estimate', () => {
      const one = hoursOf([{ code: 'C-01', quantity: 1, isLaid: false }], estimates);
      const three = hoursOf(
        [
          { code: 'C-01', quantity: 3, isLaid: false },
          { code: 'U-01', quantity: 9, isLaid: false },
        ],
        estimates,
      );
      // 20 min 32 s in the reference run.
      expect(one.low).toBeLessThan(1232 / 3600);
      expect(one.high).toBeGreaterThan(1232 / 3600);
      expect(three.low).toBeCloseTo(3 * one.low, 9);
    });
  });
});

describe('the filament to figure with', () => {
  const card = [
    { material: 'ABS', pricePerKgMinor: null },
    { material: 'petg', pricePerKgMinor: null },
  ];
  it('is the maker’s where the card has it, else the card’s first; a part’s own stays the maker’s', () => {
    expect(usualFilament('PETG', { ...spec, material: 'PETG' }, card)).toBe('petg');
    expect(usualFilament('PLA', spec, card)).toBe('ABS');
    expect(usualFilament('TPU', spec, card)).toBe('TPU');
  });
});

describe('a plan in words', () => {
  const need = {
    makers: 'PETG',
    printedIn: 'PLA',
    isOnCard: true,
    weight: { massG: 640, lengthM: 214 },
    spools: 1,
    costMinor: 1472,
  };
  const summary = {
    plates: 4,
    partsOn: 25,
    partsInAll: 27,
    hours: { low: 31, high: 62 },
    needs: [need],
    currency: 'EUR',
  };

  it('is one line of plates, hours, filament and money, for as many parts as there are on them', () => {
    expect(summaryWords(summary)).toBe(
      '4 plates for 25 of 27 parts, 31–62 h, 640 g of filament, about €14.72',
    );
    expect(summaryWords({ ...summary, partsOn: 27 })).toMatch(/^4 plates, 31–62 h/);
    expect(summaryWords({ ...summary, needs: [need, { ...need, costMinor: null }] })).toMatch(
      /1.28 kg of filament$/,
    );
  });

  it('says that another filament is figured with than the kit is drawn for', () => {
    expect(filamentNotes([need])).toEqual([expect.stringMatching(/drawn for PETG; the figures are for PLA/)]);
    expect(filamentNotes([{ ...need, printedIn: 'petg' }])).toEqual([]);
  });

  it('says how far it may be off, by the part that is least sure, and what is not in it', () => {
    const on = (code: string, mayBeOffPercent: number | null) => ({
      code,
      fit: { fit: 'fits' as const },
      isStood: false,
      isKeptOffByMargin: false,
      estimate:
        mayBeOffPercent === null ? null : { volumeMm3: 1, minutes: { low: 1, high: 2 }, mayBeOffPercent },
    });
    const words = certaintyWords({
      parts: [on('A', 8), on('B', 20), on('C', null)],
      specs: [spec],
      needs: [need],
    });
    expect(words.join(' ')).toMatch(
      /off by 20 % either way.*PLA 1\.24 g\/cm³.*1\.75 mm filament.*hours span.*on top\./,
    );
    expect(words.join(' ')).not.toMatch(/supports/);
    expect(words.at(-1)).toMatch(/cannot be estimated: C\.$/);
    const supported = certaintyWords({ parts: [], specs: [{ ...spec, supports: 'everywhere' }], needs: [] });
    expect(supported.join(' ')).toMatch(/on top\. So do the supports/);
  });
});
