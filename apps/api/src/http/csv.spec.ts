import { csvCell, csvNumber, csvRecord } from './csv.js';

describe('CSV', () => {
  // RFC 4180, section 2, rules 5 to 7.
  it('quotes cells with commas, quotes and line breaks, and doubles quotes', () => {
    expect(csvRecord(['aaa', 'b,bb', 'c"c', 'd\r\nd'])).toBe('aaa,"b,bb","c""c","d\r\nd"\r\n');
    expect(csvRecord([null, '', 12])).toBe(',,12\r\n');
  });

  // The characters are those of OWASP's page on CSV injection; from memory.
  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx'])('keeps %j from being run as a formula', (text) => {
    expect(csvCell(text).replaceAll('"', '')).toBe(`'${text}`);
  });

  it('hides a formula that would break out of its quotes', () => {
    expect(csvCell('=HYPERLINK("http://x.example","a")')).toBe(`"'=HYPERLINK(""http://x.example"",""a"")"`);
  });

  it('leaves numbers of our own as they are', () => {
    expect(csvCell(-5)).toBe('-5');
    expect(csvRecord([csvNumber('-12.00'), csvNumber('0.10')])).toBe('-12.00,0.10\r\n');
  });
});
