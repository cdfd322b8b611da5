/** The whole month before this one, in UTC as the ledger counts, both days included. */
export const lastMonth = (now: Date): { from: string; to: string } => {
  const first = new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() - 1, 1));
  const last = new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), 0));
  return { from: first.toISOString().slice(0, 10), to: last.toISOString().slice(0, 10) };
};
