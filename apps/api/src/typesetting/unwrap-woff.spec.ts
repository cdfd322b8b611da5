import { readFontFiles } from './typeface-files.js';
import { unwrapWoff } from './unwrap-woff.js';

/** The sum of a table's 32-bit words (OpenType, "Calculating checksums"). */
const checksum = (table: Buffer): number => {
  const padded = Buffer.concat([table, Buffer.alloc(-table.length & 3)]);
  let sum = 0;
  for (let at = 0; at < padded.length; at += 4) sum = (sum + padded.readUInt32BE(at)) >>> 0;
  return sum;
};

describe('unwrapWoff', () => {
  it('gives fonts whose tables have the checksums of their directory', async () => {
    for (const { bytes } of await readFontFiles()) {
      const count = bytes.readUInt16BE(4);
      expect(count).toBeGreaterThan(5);
      for (let at = 0; at < count; at += 1) {
        const record = 12 + at * 16;
        const offset = bytes.readUInt32BE(record + 8);
        const table = Buffer.from(bytes.subarray(offset, offset + bytes.readUInt32BE(record + 12)));
        // The font's own sum is left out of that of its header.
        if (bytes.toString('latin1', record, record + 4) === 'head') table.writeUInt32BE(0, 8);
        expect(checksum(table)).toBe(bytes.readUInt32BE(record + 4));
      }
    }
  });

  it('refuses what is no WOFF file', () => {
    expect(() => unwrapWoff(Buffer.from('no font'))).toThrow('is no WOFF file');
  });
});
