import { atomDocument } from './atom.js';

const feed = {
  id: 'https://shop.example/journal',
  title: 'Saltmarsh: journal',
  author: 'Saltmarsh',
  self: 'https://shop.example/api/journal.atom',
  page: 'https://shop.example/journal',
  since: new Date('2026-01-01T00:00:00Z'),
  entries: [],
};
const entry = (name: string, day: string) => ({
  id: `urn:uuid:${name}`,
  title: name,
  link: `https://shop.example/journal/${name}`,
  published: new Date(day),
  updated: new Date(day),
  summary: '',
});

describe('an Atom feed (RFC 4287)', () => {
  it('has what section 4.1.1 asks of every feed, also of one without entries: id, title, updated, author', () => {
    const document = atomDocument(feed);
    for (const tag of ['<id>', '<title>', '<updated>2026-01-01T00:00:00.000Z</updated>', '<author><name>'])
      expect(document.split(tag).length - 1).toBe(1);
    expect(document).toContain('<link rel="self"');
  });

  it('was updated when its newest entry was (section 4.2.15)', () => {
    const document = atomDocument({
      ...feed,
      entries: [entry('old', '2026-02-01T00:00:00Z'), entry('new', '2026-03-01T00:00:00Z')],
    });
    expect(/<updated>([^<]+)/.exec(document)?.[1]).toBe('2026-03-01T00:00:00.000Z');
    expect(document.match(/<entry>/g)).toHaveLength(2);
  });

  it('is well-formed whatever a title holds (XML 1.0, 2.2 and 2.4)', () => {
    const document = atomDocument({ ...feed, title: 'A <b> & "c" \u0007' });
    expect(document).toContain('<title>A &lt;b&gt; &amp; &quot;c&quot; </title>');
  });
});
