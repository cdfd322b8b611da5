/** Lines are wrapped here; RFC 5322 §2.1.1 asks for no more than 78 characters to a line. */
export const lineWidth = 72;
const longestLine = 78;

const pieces = (word: string, width: number): string[] => {
  const letters = [...word];
  const parts: string[] = [];
  for (let at = 0; at < letters.length; at += width) parts.push(letters.slice(at, at + width).join(''));
  return parts;
};

type Indents = { indent?: string; hang?: string };

/**
 * Wraps a paragraph at plain spaces; a no-break space holds words together and becomes a plain one at the
 * end. A word longer than a line is cut. `indent` goes before each line, `hang` before all but the first.
 */
export function wrapText(text: string, { indent = '', hang = indent }: Indents = {}): string {
  const width = longestLine - Math.max(indent.length, hang.length);
  const words = text
    .split(/[ \t\r\n]+/)
    .filter((word) => word !== '')
    .flatMap((word) => (word.length > width ? pieces(word, Math.floor(width / 2)) : [word]));
  const lines: string[] = [];
  let line = '';
  for (const word of words) {
    const prefix = lines.length === 0 ? indent : hang;
    if (line === '') line = prefix + word;
    else if (line.length + 1 + word.length <= lineWidth) line += ` ${word}`;
    else {
      lines.push(line);
      line = hang + word;
    }
  }
  if (line !== '') lines.push(line);
  return lines.join('\n').replace(/[\u00a0\u202f]/g, ' ');
}
