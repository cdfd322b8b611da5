import { clearanceSigns, type Clearance, type ReprintList, type ReprintPart } from '@windchest/contracts';
import type { NetRow } from '../../catalogue/catalogue-reader.js';

/** Pieces of one part that somebody printed, all alike. */
export interface PrintedPieces {
  readonly revisionId: string;
  /** Null where nobody said: as the reader prints. */
  readonly clearance: Clearance | null;
  readonly quantity: number;
  /** What was printed, whatever its revision is called; null where it was never measured. */
  readonly geometryHash: string | null;
}

/** What is known of one person's prints of a kit. */
export interface PrintedState {
  /** Last fetched, or said to be printed. */
  readonly heldRevisionId: string | null;
  /** What the person prints in, once it is known. */
  readonly clearance: Clearance | null;
  /** By part code; a code without an entry is taken to be as the revision held has it. */
  readonly record: ReadonlyMap<string, readonly PrintedPieces[]>;
}

export interface RevisionOfKit {
  readonly id: string;
  readonly label: string;
  readonly mark: number;
}

export interface ReprintQuestion {
  readonly printed: PrintedState;
  readonly to: RevisionOfKit;
  /** All of the kit that were released, newest first. */
  readonly revisions: readonly RevisionOfKit[];
  /** Net rows between a revision (or none) and the wanted one, by part code. */
  readonly net: (fromRevisionId: string | null, clearance: Clearance | null) => ReadonlyMap<string, NetRow>;
}

/** Pieces that are printed, against the part as it is wanted. */
interface Judged {
  readonly pieces: PrintedPieces;
  readonly row: NetRow;
  readonly use: 'as-it-is' | 'no-more' | 'if-it-does-not-trouble' | 'unmarked';
  readonly whatDiffers: string;
}

/** The pairs of revisions a list needs to know of: `[from, clearance]`. */
export const pairsNeeded = ({ heldRevisionId, clearance, record }: PrintedState): Pair[] => [
  [heldRevisionId, clearance],
  ...[...record.values()].flat().map((one): Pair => [one.revisionId, clearance ?? one.clearance]),
];
type Pair = [fromRevisionId: string | null, clearance: Clearance | null];

/** What is to print, for one person, so that their build becomes the wanted revision. */
export const reprintListOf = (question: ReprintQuestion): ReprintList => {
  const { printed, to, revisions, net } = question;
  const held = net(printed.heldRevisionId, printed.clearance);
  const codes = new Set([...held.keys(), ...printed.record.keys()]);
  const from = new Set<string>();
  const isRecorded = [...printed.record.values()].some((pieces) => pieces.some((one) => one.quantity > 0));
  const parts = [...codes].sort().flatMap((code) => {
    const wanted = held.get(code);
    const judged = piecesOf(code, question).flatMap((pieces) => judge(code, pieces, question) ?? []);
    for (const { pieces } of judged) from.add(pieces.revisionId);
    // A gauge that has told what it is there to tell is not printed again.
    if (wanted?.isGauge && printed.clearance) return [];
    // Whoever has not said which clearance they print goes on in that of the pieces they have.
    const row = printed.clearance ? (wanted ?? judged[0]?.row) : (judged[0]?.row ?? wanted);
    return row ? (partOf(row, judged, printed.record.has(code)) ?? []) : [];
  });
  const older = revisions.filter(({ id }) => from.has(id));
  const foreign = older.filter(({ mark }) => mark !== to.mark);
  return {
    from: {
      basis: isRecorded ? 'print-record' : printed.heldRevisionId ? 'held' : 'nothing',
      labels: older.map(({ label }) => label),
    },
    to: { id: to.id, label: to.label },
    breaks:
      foreign.length > 0
        ? { from: [...new Set(foreign.map(({ mark }) => `Mk ${mark}`))], to: `Mk ${to.mark}` }
        : null,
    parts: [
      ...parts.filter(({ advice }) => advice !== 'dropped'),
      ...parts.filter(({ advice }) => advice === 'dropped'),
    ],
  };
};

/** What is printed of a part: as it was said; else all that the revision held has of it. */
const piecesOf = (code: string, { printed, net }: ReprintQuestion): readonly PrintedPieces[] => {
  const said = printed.record.get(code);
  if (said) return said.filter(({ quantity }) => quantity > 0);
  const { heldRevisionId: revisionId, clearance } = printed;
  const quantity = net(revisionId, clearance).get(code)?.quantityBefore ?? 0;
  return revisionId && quantity > 0 ? [{ revisionId, clearance, quantity, geometryHash: null }] : [];
};

const judge = (code: string, pieces: PrintedPieces, question: ReprintQuestion): Judged | null => {
  const { printed, to, revisions, net } = question;
  const wantedClearance = printed.clearance ?? pieces.clearance;
  const row = net(pieces.revisionId, wantedClearance).get(code);
  if (!row) return null;
  const mark = revisions.find(({ id }) => id === pieces.revisionId)?.mark;
  if (mark !== undefined && mark !== to.mark)
    return {
      pieces,
      row,
      use: 'no-more',
      whatDiffers: `of Mk ${mark}, which does not go with Mk ${to.mark}`,
    };
  const hash = row.hashes[row.clearance ?? 'zero'] ?? row.hashes.zero;
  if (pieces.geometryHash !== null && pieces.geometryHash === hash)
    return { pieces, row, use: 'as-it-is', whatDiffers: '' };
  if (row.clearance && pieces.clearance && row.clearance !== pieces.clearance) {
    const [was, is] = [clearanceSigns[pieces.clearance], clearanceSigns[row.clearance]];
    return { pieces, row, use: 'no-more', whatDiffers: `printed in ${was}, you print in ${is}` };
  }
  if (row.difference !== 'changed') return { pieces, row, use: 'as-it-is', whatDiffers: row.whatDiffers };
  const strongest = strongestOf(row.steps);
  const use = strongest === 'reprint needed' ? 'no-more' : strongest ? 'if-it-does-not-trouble' : 'unmarked';
  return { pieces, row, use, whatDiffers: row.whatDiffers };
};

const partOf = (row: NetRow, judged: readonly Judged[], isRecorded: boolean): ReprintPart | null => {
  const count = (...uses: Judged['use'][]): number =>
    judged.filter(({ use }) => uses.includes(use)).reduce((sum, one) => sum + one.pieces.quantity, 0);
  const { code, name, quantity, clearance, drawing } = row;
  const told = { code, name, quantity, clearance, drawing };
  if (quantity === 0) {
    const spare = judged.reduce((sum, one) => sum + one.pieces.quantity, 0);
    if (spare === 0) return null;
    const difference = 'dropped';
    const whatDiffers = 'no longer in the kit';
    return { ...told, ...nothing, steps: [], advice: 'dropped', spare, difference, whatDiffers };
  }
  const good = count('as-it-is');
  const usable = good + count('if-it-does-not-trouble', 'unmarked');
  const print = Math.max(0, quantity - usable);
  // Good pieces take their places first, then those that may trouble are replaced.
  const optional = Math.min(count('if-it-does-not-trouble'), Math.max(0, quantity - good - print));
  const unmarked = Math.min(count('unmarked'), Math.max(0, quantity - good - print - optional));
  const spare = Math.max(0, good - quantity);
  const old = judged.filter(({ use }) => use !== 'as-it-is');
  const steps = unique(old.flatMap((one) => one.row.steps));
  const have = judged.reduce((sum, one) => sum + one.pieces.quantity, 0);
  return {
    ...told,
    advice:
      print > 0
        ? 'print'
        : optional > 0
          ? 'if-it-troubles'
          : unmarked > 0
            ? 'not-asked'
            : spare > 0
              ? 'fewer'
              : null,
    print,
    optional,
    done: Math.min(good, quantity),
    spare,
    difference: differenceOf(judged, old),
    whatDiffers: [
      ...new Set((old.length > 0 ? old : judged).map((one) => one.whatDiffers)),
      piecesWords(row, have, isRecorded),
    ]
      .filter((words) => words !== '')
      .join(', '),
    mark: strongestOf(steps),
    steps,
  };
};

const nothing = { print: 0, optional: 0, done: 0, mark: null };

/** Pieces that count as changed for another reason than their shape (mark, clearance) are no less changed. */
const differenceOf = (judged: readonly Judged[], old: readonly Judged[]): ReprintPart['difference'] => {
  if (judged.length === 0) return 'new';
  if (old.length > 0) return 'changed';
  return judged.some((one) => one.whatDiffers !== '') ? 're-exported' : 'same';
};

const piecesWords = (row: NetRow, have: number, isRecorded: boolean): string => {
  if (have === row.quantity) return '';
  if (have === 0) return isRecorded ? 'not printed yet' : 'a new part';
  return isRecorded ? `${have} of ${row.quantity} pieces printed` : `${have} → ${row.quantity} pieces`;
};

const strongestOf = (steps: NetRow['steps']): ReprintPart['mark'] =>
  steps.some(({ mark }) => mark === 'reprint needed') ? 'reprint needed' : (steps[0]?.mark ?? null);

const unique = (steps: readonly NetRow['steps'][number][]): NetRow['steps'][number][] => [
  ...new Map(steps.map((step) => [`${step.revision} ${step.mark} ${step.reason}`, step])).values(),
];
