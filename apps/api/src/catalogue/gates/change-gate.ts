import { listed, notNeeded, open, passed, type GateCheck } from './gate-facts.js';

/** Whoever holds the last revision learns about each changed part whether to print it again, and why. */
export const changesMarked: GateCheck = ({ changes }) => {
  const name = 'changes-marked';
  if (changes === null) return notNeeded(name, 'The first revision changes nothing.');
  const isWaiting = ({ deviation }: (typeof changes)[number]) => deviation?.state === 'waiting';
  const waiting = changes.filter(isWaiting).map((row) => row.code);
  // What turns out to be the same shape needs no mark.
  const changed = changes.filter((row) => row.difference === 'changed' && !isWaiting(row));
  const unmarked = changed.filter((row) => row.mark === null).map((row) => row.code);
  const unexplained = changed.filter((row) => row.mark !== null && row.reason === '').map((row) => row.code);
  const faults = [
    ...(waiting.length > 0
      ? [`${listed(waiting)} ${waiting.length === 1 ? 'is' : 'are'} being compared with the last revision.`]
      : []),
    ...(unmarked.length > 0 ? [`Mark whether to reprint ${listed(unmarked)}.`] : []),
    ...(unexplained.length > 0 ? [`Give a reason for ${listed(unexplained)}.`] : []),
  ];
  if (faults.length > 0) return open(name, faults.join(' '));
  return passed(
    name,
    changed.length === 0 ? 'No part changed.' : 'Every changed part has a mark and a reason.',
  );
};
