import type { ReprintPart } from '@windchest/contracts';
import fc from 'fast-check';
import { netRows, type MarkedStep } from '../../catalogue/comparison/net-rows.js';
import type { PartOfRevision } from '../../catalogue/revisions/revision-contents.js';
import { reprintLines } from './reprint-words.js';
import { reprintListOf, type PrintedPieces, type PrintedState } from './reprint-list.js';

type Mark = MarkedStep['mark'] | null;
/** A part in one revision: its shape, how often it was exported since, how many of it, and the maker's mark. */
interface Made {
  shape: number;
  exported: number;
  quantity: number;
  mark: Mark;
}
interface Revision {
  id: string;
  label: string;
  mark: number;
  parts: Record<string, Made>;
}

const partOf = (code: string, { shape, exported, quantity }: Made): PartOfRevision => ({
  id: code,
  revisionId: 'r',
  code,
  name: `Part ${code}`,
  quantity,
  orientation: 'may-turn',
  printSpec: null,
  voice: null,
  mark: null,
  reason: '',
  isGauge: code === 'G-01',
  variants: [],
  file: {
    id: code,
    sha256: `sha ${shape} ${exported}`,
    fileName: `${code}.stl`,
    bytes: 1,
    kind: 'stl',
    addedAt: new Date(0),
    measuring: 'measured',
    measured: {
      sizeMm: [shape, 1, 1],
      minMm: [0, 0, 0],
      maxMm: [shape, 1, 1],
      volumeMm3: shape,
      areaMm2: shape,
    } as never,
    geometryHash: `shape ${shape}`,
    drawings: null,
    previewSha256: null,
    fault: null,
  },
});
const partsOf = (revision: Revision) =>
  Object.entries(revision.parts).map(([code, made]) => partOf(code, made));

/** The list as the shop makes it; the chain is oldest first. */
const listOf = (chain: readonly Revision[], toAt: number, printed: PrintedState) => {
  const at = (id: string) => chain.findIndex((one) => one.id === id);
  return reprintListOf({
    printed,
    to: chain[toAt]!,
    revisions: chain.toReversed(),
    net: (fromId, clearance) => {
      const [first, last] = fromId === null ? [0, -1] : [at(fromId), toAt].sort((a, b) => a - b);
      const steps = chain
        .slice(first! + 1, last! + 1)
        .toReversed()
        .flatMap(({ label, parts }) =>
          Object.entries(parts).flatMap(([code, { mark }]) =>
            mark ? [{ code, revision: label, mark, reason: `in ${label}` }] : [],
          ),
        );
      const rows = netRows({
        before: fromId === null ? null : partsOf(chain[at(fromId)]!),
        after: partsOf(chain[toAt]!),
        steps,
        clearance,
        known: () => ({ state: 'waiting' }),
      });
      return new Map(rows.map((row) => [row.code, row]));
    },
  });
};

const codes = ['A-01', 'B-01', 'C-01', 'D-01'];
const made = fc.record({
  shape: fc.integer({ min: 1, max: 3 }),
  exported: fc.integer({ min: 1, max: 2 }),
  quantity: fc.integer({ min: 1, max: 4 }),
  mark: fc.constantFrom<Mark>(null, 'reprint needed', 'reprint if it troubles you'),
});
/** Shapes are few, so that parts change and change back all the time. */
const chains = fc
  .array(fc.dictionary(fc.constantFrom(...codes), made, { noNullPrototype: true }), {
    minLength: 2,
    maxLength: 6,
  })
  .map((all) => all.map((parts, at): Revision => ({ id: `r${at}`, label: `Mk 1.${at}`, mark: 1, parts })));

/** What the list must say of a part of which these pieces are there: an independent, simple telling. */
const expected = (
  chain: readonly Revision[],
  toAt: number,
  code: string,
  pieces: { at: number; quantity: number }[],
) => {
  const wanted = chain[toAt]!.parts[code];
  const have = pieces.reduce((sum, one) => sum + one.quantity, 0);
  if (!wanted) return have > 0 ? { print: 0, optional: 0, spare: have } : null;
  const bins = { good: 0, bad: 0, meh: 0, other: 0 };
  for (const { at, quantity } of pieces) {
    const marks = chain
      .slice(Math.min(at, toAt) + 1, Math.max(at, toAt) + 1)
      .map((one) => one.parts[code]?.mark);
    const bin =
      chain[at]!.parts[code]!.shape === wanted.shape
        ? 'good'
        : marks.includes('reprint needed')
          ? 'bad'
          : marks.includes('reprint if it troubles you')
            ? 'meh'
            : 'other';
    bins[bin] += quantity;
  }
  let open = wanted.quantity - bins.good;
  const inTheMeantime = Math.max(0, Math.min(open, bins.meh + bins.other));
  const print = Math.max(0, open - inTheMeantime);
  open = Math.max(0, open - print);
  return {
    print,
    optional: Math.min(bins.meh, open),
    spare: Math.max(0, bins.good - wanted.quantity),
  };
};
const told = (part: ReprintPart | undefined) =>
  part ? { print: part.print, optional: part.optional, spare: part.spare } : null;
const state = (more: Partial<PrintedState>): PrintedState => ({
  heldRevisionId: null,
  clearance: null,
  record: new Map(),
  ...more,
});

describe('a reprint list', () => {
  it('is net by shape over any chain of revisions, from any one held to any other', () => {
    fc.assert(
      fc.property(chains, fc.nat(), fc.nat(), (chain, a, b) => {
        const [from, to] = [a % chain.length, b % chain.length];
        const list = listOf(chain, to, state({ heldRevisionId: `r${from}` }));
        for (const code of codes) {
          const quantity = chain[from]!.parts[code]?.quantity;
          expect([code, told(list.parts.find((part) => part.code === code))]).toEqual([
            code,
            expected(chain, to, code, quantity ? [{ at: from, quantity }] : []),
          ]);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('goes by the print record part by part, whatever revisions the pieces are from', () => {
    const prints = fc.array(fc.record({ at: fc.nat(), quantity: fc.nat({ max: 3 }) }), { maxLength: 3 });
    fc.assert(
      fc.property(chains, fc.nat(), prints, (chain, b, wish) => {
        const to = b % chain.length;
        const record = new Map<string, PrintedPieces[]>();
        const own = new Map<string, { at: number; quantity: number }[]>();
        for (const code of codes) {
          const pieces = wish
            .map(({ at, quantity }) => ({ at: at % chain.length, quantity }))
            .filter(({ at }) => chain[at]!.parts[code]);
          if (pieces.length === 0) continue;
          own.set(code, pieces);
          record.set(
            code,
            pieces.map(({ at, quantity }) => ({
              revisionId: `r${at}`,
              clearance: 'zero',
              quantity,
              geometryHash: `shape ${chain[at]!.parts[code]!.shape}`,
            })),
          );
        }
        const list = listOf(chain, to, state({ record }));
        for (const code of codes)
          expect([code, told(list.parts.find((part) => part.code === code))]).toEqual([
            code,
            expected(chain, to, code, own.get(code) ?? []),
          ]);
      }),
      { numRuns: 300 },
    );
  });

  const plain = { shape: 1, exported: 1, quantity: 2, mark: null } as const;
  const chain = (last: Partial<Revision> = {}): Revision[] => [
    { id: 'r0', label: 'Mk 1.0', mark: 1, parts: { 'A-01': plain, 'B-01': plain, 'G-01': plain } },
    {
      id: 'r1',
      label: 'Mk 1.1',
      mark: 1,
      parts: {
        'A-01': { ...plain, shape: 2, mark: 'reprint needed' },
        'B-01': { ...plain, shape: 2, mark: 'reprint if it troubles you' },
        'G-01': { ...plain, shape: 2, mark: 'reprint needed' },
      },
    },
    {
      id: 'r2',
      label: 'Mk 1.2',
      mark: 1,
      parts: {
        'A-01': { ...plain, shape: 3, mark: 'reprint if it troubles you' },
        'B-01': plain,
        'G-01': { ...plain, shape: 2 },
      },
      ...last,
    },
  ];
  const from0 = state({ heldRevisionId: 'r0' });

  it('takes the strongest mark on the way, with the reason of each step, newest first', () => {
    expect(listOf(chain(), 2, from0).parts[0]).toMatchObject({
      code: 'A-01',
      advice: 'print',
      print: 2,
      mark: 'reprint needed',
      steps: [
        { revision: 'Mk 1.2', mark: 'reprint if it troubles you', reason: 'in Mk 1.2' },
        { revision: 'Mk 1.1', mark: 'reprint needed', reason: 'in Mk 1.1' },
      ],
    });
  });

  it('leaves a part out that was changed and changed back', () => {
    expect(listOf(chain(), 2, from0).parts[1]).toMatchObject({ code: 'B-01', advice: null, steps: [] });
  });

  it('leaves the gauge out once the clearance is known', () => {
    const codesFor = (clearance: 'plus' | null) =>
      listOf(chain(), 1, { ...from0, clearance }).parts.map(({ code }) => code);
    expect(codesFor(null)).toEqual(['A-01', 'B-01', 'G-01']);
    expect(codesFor('plus')).toEqual(['A-01', 'B-01']);
  });

  it('counts everything as to print for another mark, even a part of the same shape, and says which marks', () => {
    const list = listOf(chain({ label: 'Mk 2.0', mark: 2 }), 2, from0);
    expect(list.breaks).toEqual({ from: ['Mk 1'], to: 'Mk 2' });
    expect(list.parts.map(({ advice, print }) => [advice, print])).toEqual([
      ['print', 2],
      ['print', 2],
      ['print', 2],
    ]);
    expect(list.parts[1]?.whatDiffers).toBe('of Mk 1, which does not go with Mk 2');
  });

  it('says how many more pieces are needed, how many fewer, and what was taken back', () => {
    const parts = { 'A-01': { ...plain, quantity: 5 }, 'B-01': { ...plain, quantity: 1 } };
    const more = chain({ parts });
    expect(listOf(more, 2, from0).parts).toMatchObject([
      { code: 'A-01', advice: 'print', print: 3, whatDiffers: '2 → 5 pieces' },
      { code: 'B-01', advice: 'fewer', spare: 1, whatDiffers: '2 → 1 pieces' },
      { code: 'G-01', advice: 'dropped', spare: 2 },
    ]);
    const none = { revisionId: 'r0', clearance: 'zero', quantity: 0, geometryHash: 'shape 1' } as const;
    const taken = listOf(more, 2, { ...from0, record: new Map([['B-01', [none]]]) });
    expect(taken.parts[1]).toMatchObject({ advice: 'print', print: 1, whatDiffers: 'not printed yet' });
    expect(taken.from).toEqual({ basis: 'held', labels: ['Mk 1.0'] });
  });

  it('is told line by line in an e-mail: what to print, how often, and the reasons', () => {
    expect(reprintLines(listOf(chain(), 2, from0))).toEqual([
      {
        code: 'A-01',
        name: 'Part A-01',
        quantity: 2,
        isOnlyIfItTroubles: false,
        why: 'in Mk 1.2 · in Mk 1.1',
      },
      { code: 'G-01', name: 'Part G-01', quantity: 2, isOnlyIfItTroubles: false, why: 'in Mk 1.1' },
    ]);
    expect(reprintLines(listOf(chain(), 1, from0)).at(-1)).toMatchObject({
      code: 'B-01',
      isOnlyIfItTroubles: true,
      why: 'in Mk 1.1',
    });
  });

  it('lists everything for whom nothing is known', () => {
    const list = listOf(chain(), 2, state({}));
    expect(list.from).toEqual({ basis: 'nothing', labels: [] });
    expect(list.parts.map(({ difference, print }) => [difference, print])).toEqual([
      ['new', 2],
      ['new', 2],
      ['new', 2],
    ]);
  });
});
