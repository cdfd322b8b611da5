/** Puts a piece into a text where the selection is; says where the cursor then stands. */
export function withInserted(
  text: string,
  piece: string,
  selection: { start: number; end: number },
): { text: string; cursor: number } {
  const start = Math.min(Math.max(0, selection.start), text.length);
  const end = Math.min(Math.max(start, selection.end), text.length);
  return { text: text.slice(0, start) + piece + text.slice(end), cursor: start + piece.length };
}

/** A block starts on a line of its own, with an empty line before it. */
export function withBlock(
  text: string,
  block: string,
  selection: { start: number; end: number },
): { text: string; cursor: number } {
  const before = text.slice(0, selection.start);
  const gap = before === '' || before.endsWith('\n\n') ? '' : before.endsWith('\n') ? '\n' : '\n\n';
  return withInserted(text, gap + block, selection);
}
