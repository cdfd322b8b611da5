/** `Mk 1.4` → mark 1, issue 4. */
const numbersOf = (label: string): { mark: number; issue: number } | null => {
  const match = /(\d+)\.(\d+)$/.exec(label);
  return match ? { mark: Number(match[1]), issue: Number(match[2]) } : null;
};

/** What the next revision would be called: by its issue, where parts interchange, and by its mark, where not. */
export function nextLabels(labels: readonly string[]): { issue: string; mark: string } {
  const numbers = labels.flatMap((label) => numbersOf(label) ?? []);
  const last = numbers.sort((a, b) => b.mark - a.mark || b.issue - a.issue)[0];
  if (!last) return { issue: 'Mk 1.0', mark: 'Mk 1.0' };
  return { issue: `Mk ${last.mark}.${last.issue + 1}`, mark: `Mk ${last.mark + 1}.0` };
}
