import fc from 'fast-check';
import { wrapText } from './wrap-text.js';

describe('wrapping text', () => {
  it('breaks at spaces and holds no-break spaces together', () => {
    const text = `${'word '.repeat(13)}as Mk\u00a01.4 says`;
    expect(wrapText(text).split('\n')).toEqual([`${'word '.repeat(13)}as`, 'Mk 1.4 says']);
  });

  it('indents the first line and the ones after it', () => {
    const lines = wrapText('part '.repeat(30), { indent: '- ', hang: '  ' }).split('\n');
    expect(lines[0]).toMatch(/^- part/);
    expect(lines.slice(1).every((line) => /^ {2}part/.test(line))).toBe(true);
  });

  it('never passes 78 characters and loses none but spaces', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 400, unit: 'grapheme' }), (text) => {
        const wrapped = wrapText(text, { indent: '> ' });
        for (const line of wrapped.split('\n')) expect(line.length).toBeLessThanOrEqual(78);
        const bare = (value: string): string => value.replace(/[ \t\r\n\u00a0\u202f]/g, '');
        expect(bare(wrapped.replace(/^> /gm, ''))).toBe(bare(text));
      }),
    );
  });
});
