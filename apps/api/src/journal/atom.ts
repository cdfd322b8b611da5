export interface AtomEntry {
  /** A permanent IRI that is never used for another entry (RFC 4287, 4.2.6). */
  readonly id: string;
  readonly title: string;
  readonly link: string;
  readonly published: Date;
  readonly updated: Date;
  readonly summary: string;
}
export interface AtomFeed {
  readonly id: string;
  readonly title: string;
  readonly author: string;
  /** Where the feed itself stands, and the page it tells of. */
  readonly self: string;
  readonly page: string;
  /** When nothing has been published yet. */
  readonly since: Date;
  readonly entries: readonly AtomEntry[];
}

/** An Atom feed document (RFC 4287). */
export const atomDocument = (feed: AtomFeed): string => {
  const newest = feed.entries.reduce(
    (latest, { updated }) => (updated > latest ? updated : latest),
    feed.entries[0]?.updated ?? feed.since,
  );
  return [
    '<?xml version="1.0" encoding="utf-8"?>',
    '<feed xmlns="http://www.w3.org/2005/Atom">',
    `  <id>${escapeXml(feed.id)}</id>`,
    `  <title>${escapeXml(feed.title)}</title>`,
    `  <updated>${newest.toISOString()}</updated>`,
    `  <author><name>${escapeXml(feed.author)}</name></author>`,
    `  <link rel="self" type="application/atom+xml" href="${escapeXml(feed.self)}"/>`,
    `  <link rel="alternate" type="text/html" href="${escapeXml(feed.page)}"/>`,
    ...feed.entries.map(entryLines),
    '</feed>',
    '',
  ].join('\n');
};

const entryLines = (entry: AtomEntry): string =>
  [
    '  <entry>',
    `    <id>${escapeXml(entry.id)}</id>`,
    `    <title>${escapeXml(entry.title)}</title>`,
    `    <published>${entry.published.toISOString()}</published>`,
    `    <updated>${entry.updated.toISOString()}</updated>`,
    `    <link rel="alternate" type="text/html" href="${escapeXml(entry.link)}"/>`,
    `    <summary>${escapeXml(entry.summary)}</summary>`,
    '  </entry>',
  ].join('\n');

/** XML 1.0 has no way to write most control characters, so they are left out. */
const escapeXml = (text: string): string =>
  text
    // oxlint-disable-next-line no-control-regex
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
