import { LetterComposer, type ReaderFacts } from './compose-letter.js';
import { filledMarkdown } from './plain-letter.js';
import type { ToPrint } from './reprint-book.js';

const tongue: ToPrint = {
  code: 'J-01',
  name: 'Tongue',
  quantity: 2,
  isOnlyIfItTroubles: false,
  why: 'Too tight',
};
const reader: ReaderFacts = {
  name: 'Wren',
  held: 'Mk 1.0',
  toPrint: [tongue],
  downloadLink: 'https://saltmarsh.example/shelf/curlew',
};
const mailOf = (body: string, more: Partial<ReaderFacts> = {}, kind: 'service' | 'news' = 'service') =>
  new LetterComposer(
    { kind, subject: '{kit} for {name}', body },
    {
      workshop: { name: 'Saltmarsh', baseUrl: 'https://saltmarsh.example', locale: 'en-IE' },
      kit: { name: 'Curlew', slug: 'curlew', colourHex: '#e97c48' },
      newest: 'Mk 1.1',
    },
  ).for({ ...reader, ...more });

describe('a letter for one reader', () => {
  it('says the same as HTML and as text', () => {
    const { subject, html, text } = mailOf(
      'Hello **{name}**,\n\n## What differs\n\n- see [[J-01]]\n- you hold {held}\n\n{reprint_list}\n\n{download_link}',
    );
    expect(subject).toBe('Curlew for Wren');
    expect(html).toContain('Hello <strong>Wren</strong>,');
    expect(html).toMatch(/<h2[^>]*>What differs<\/h2>/);
    expect(html).toMatch(/<strong>J-01<\/strong><br>Tongue/);
    expect(html).toContain('href="https://saltmarsh.example/shelf/curlew"');
    expect(text).toContain('Hello Wren,\n\nWhat differs\n------------\n\n- see J-01\n- you hold Mk 1.0\n');
    expect(text).toContain('- J-01 Tongue × 2\n  Too tight');
    expect(text).toContain('Get the files:\nhttps://saltmarsh.example/shelf/curlew');
  });

  it('shows raw HTML as text and lets no address through that is no web address', () => {
    const { html } = mailOf(
      '<script>alert(1)</script>\n\nx <b onclick="y">z</b> [a](javascript:alert(1)) ![p](https://elsewhere.example/p.png) ![q](/q.png)',
      { name: '<img src=x>' },
    );
    expect(html).not.toMatch(/<script>alert|<b onclick|javascript:|elsewhere|<img src=x/);
    expect(html).toContain('&lt;script&gt;');
    expect(html).toContain('src="https://saltmarsh.example/q.png"');
  });

  it('repeats no name that is an advertisement', () => {
    expect(mailOf('Hello {name},', { name: 'Cheap www.pills.example' }).text).toContain('Hello,\n');
  });

  it('says where it ends: news by its link, a letter about a kit on the account', () => {
    const stopLink = 'https://saltmarsh.example/unsubscribe/x';
    expect(mailOf('x', { stopLink }, 'news').text).toContain(`Stop the news:\n${stopLink}`);
    const service = mailOf('x', { stopLink }).text;
    expect([service.includes(stopLink), service.includes('https://saltmarsh.example/account')]).toEqual([
      false,
      true,
    ]);
  });

  it('says that there is nothing to do where there is nothing', () => {
    expect(mailOf('{reprint_list}', { toPrint: [] }).text).toContain('there is nothing to reprint');
  });

  it('keeps a long address whole in the text', () => {
    const address = `https://saltmarsh.example/${'a'.repeat(120)}`;
    expect(mailOf(`See [the notes](${address}) first.`).text).toContain(`<${address}>`);
  });
});

describe('a letter as a page', () => {
  const values = {
    name: 'Wren_*x*',
    kit: 'Curlew',
    held: 'Mk 1.0',
    newest: 'Mk 1.1',
    download_link: 'https://a.example',
  };

  it('takes a name as words and not as Markdown', () => {
    expect(filledMarkdown('Hello {name}', values, null)).toBe('Hello Wren\\_\\*x\\*');
  });

  it('leaves out for everybody what was one reader’s own', () => {
    expect(filledMarkdown('a\n\n{reprint_list}\n\nb', values, null)).toBe('a\n\nb');
    expect(filledMarkdown('{reprint_list}', values, [tongue])).toBe('- **J\\-01** Tongue × 2: Too tight');
  });
});
