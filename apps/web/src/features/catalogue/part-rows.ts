import type { Comparison, Part } from '@windchest/contracts';

export type ComparisonRow = Comparison['rows'][number];
export type Difference = ComparisonRow['difference'];

/** A line of the parts table: a part with what differs, or a part the earlier revision had. */
export interface PartRow {
  code: string;
  name: string;
  quantity: number;
  part: Part | null;
  comparison: ComparisonRow | null;
}

/** What asks for a look stands first. */
const order: readonly Difference[] = ['changed', 'new', 're-exported', 'dropped', 'same'];
const rankOf = ({ comparison }: PartRow) =>
  comparison ? order.indexOf(comparison.difference) : order.length;

const byCode = new Intl.Collator('en', { numeric: true });

/** Parts and comparison joined by code; dropped parts have no part any more. */
export function partRows(parts: readonly Part[], comparison: Comparison | undefined): PartRow[] {
  const compared = new Map(comparison?.with ? comparison.rows.map((row) => [row.code, row]) : []);
  const present = parts.map((part): PartRow => ({
    code: part.code,
    name: part.name,
    quantity: part.quantity,
    part,
    comparison: compared.get(part.code) ?? null,
  }));
  const known = new Set(parts.map((part) => part.code));
  const dropped = [...compared.values()].flatMap((row): PartRow[] =>
    row.difference === 'dropped' && !known.has(row.code)
      ? [{ code: row.code, name: row.name, quantity: row.quantity, part: null, comparison: row }]
      : [],
  );
  return [...present, ...dropped].sort((a, b) => rankOf(a) - rankOf(b) || byCode.compare(a.code, b.code));
}

/** Whether a reader who looks for changes wants to see it. */
export const isDifferent = ({ comparison }: PartRow): boolean =>
  comparison !== null && comparison.difference !== 'same' && comparison.difference !== 're-exported';

/** How many parts differ in which way, in the order they are told; nothing where the count is nought. */
export function countedDifferences(
  rows: readonly ComparisonRow[],
): { difference: Difference; count: number }[] {
  return order
    .map((difference) => ({
      difference,
      count: rows.filter((row) => row.difference === difference).length,
    }))
    .filter(({ count }) => count > 0);
}
