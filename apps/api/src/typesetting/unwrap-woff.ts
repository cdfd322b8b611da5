import { inflateSync } from 'node:zlib';

const woffHeaderBytes = 44;
const woffEntryBytes = 20;
const sfntHeaderBytes = 12;
const sfntEntryBytes = 16;

/**
 * A WOFF file as the plain font it wraps (WOFF File Format 1.0, sections 3 to 5; OpenType, table directory). pdfkit
 * reads WOFF too, but inflates it in JavaScript and anew for each document, which took most of a book's time.
 * @throws Error for what is no WOFF file
 */
export const unwrapWoff = (woff: Buffer): Buffer => {
  if (woff.length < woffHeaderBytes || woff.toString('latin1', 0, 4) !== 'wOFF')
    throw new Error('A font file is no WOFF file: install the packages again.');
  const count = woff.readUInt16BE(12);
  const header = Buffer.alloc(sfntHeaderBytes + count * sfntEntryBytes);
  woff.copy(header, 0, 4, 8);
  header.writeUInt16BE(count, 4);
  const entrySelector = Math.floor(Math.log2(count));
  header.writeUInt16BE(16 * 2 ** entrySelector, 6);
  header.writeUInt16BE(entrySelector, 8);
  header.writeUInt16BE(16 * count - 16 * 2 ** entrySelector, 10);

  const pieces: Uint8Array[] = [header];
  let offset = header.length;
  for (let at = 0; at < count; at += 1) {
    const entry = woffHeaderBytes + at * woffEntryBytes;
    const from = woff.readUInt32BE(entry + 4);
    const packed = woff.subarray(from, from + woff.readUInt32BE(entry + 8));
    const length = woff.readUInt32BE(entry + 12);
    // A table that deflating would not make smaller is stored as it is.
    const table = packed.length < length ? inflateSync(packed) : packed;
    const record = sfntHeaderBytes + at * sfntEntryBytes;
    woff.copy(header, record, entry, entry + 4);
    woff.copy(header, record + 4, entry + 16, entry + 20);
    header.writeUInt32BE(offset, record + 8);
    header.writeUInt32BE(length, record + 12);
    const padding = -length & 3;
    pieces.push(table, Buffer.alloc(padding));
    offset += length + padding;
  }
  return Buffer.concat(pieces);
};
