import type { PictureType } from './picture-kind.js';

/**
 * The same picture without what cameras write into it beside the image: place, time, owner, remarks.
 * Colour profiles and the turn of the image stay out too where they stand in such a block; browsers that
 * send through the shop's own pages have drawn the picture upright before.
 */
export const withoutMetadata = (bytes: Buffer, type: PictureType): Buffer => {
  if (type === 'image/jpeg') return withoutJpegSegments(bytes);
  if (type === 'image/png') return withoutPngChunks(bytes);
  return withoutWebpChunks(bytes);
};

const START_OF_SCAN = 0xda;

/** Drops APP1 to APP13, APP15 and comments (ITU-T T.81, B.2.4.6); APP0 and APP14 say how colours are coded. */
const withoutJpegSegments = (bytes: Buffer): Buffer => {
  const kept: Buffer[] = [bytes.subarray(0, 2)];
  let at = 2;
  while (at + 4 <= bytes.length && bytes[at] === 0xff) {
    const marker = bytes[at + 1]!;
    if (marker === START_OF_SCAN) break;
    const end = at + 2 + bytes.readUInt16BE(at + 2);
    if (end > bytes.length) break;
    const isMetadata = (marker >= 0xe1 && marker <= 0xed) || marker === 0xef || marker === 0xfe;
    if (!isMetadata) kept.push(bytes.subarray(at, end));
    at = end;
  }
  return Buffer.concat([...kept, bytes.subarray(at)]);
};

const PNG_METADATA = new Set(['tEXt', 'zTXt', 'iTXt', 'eXIf', 'tIME']);

/** PNG is a signature and chunks: length, type, data, checksum (ISO/IEC 15948, 5.3). */
const withoutPngChunks = (bytes: Buffer): Buffer => {
  const kept: Buffer[] = [bytes.subarray(0, 8)];
  let at = 8;
  while (at + 12 <= bytes.length) {
    const end = at + 12 + bytes.readUInt32BE(at);
    if (end > bytes.length) break;
    if (!PNG_METADATA.has(bytes.subarray(at + 4, at + 8).toString('latin1')))
      kept.push(bytes.subarray(at, end));
    at = end;
  }
  return Buffer.concat([...kept, bytes.subarray(at)]);
};

/** WebP is a RIFF of padded chunks; the extended header tells of EXIF and XMP by two bits (RFC 9649, 2.7). */
const withoutWebpChunks = (bytes: Buffer): Buffer => {
  const kept: Buffer[] = [];
  let at = 12;
  while (at + 8 <= bytes.length) {
    const size = bytes.readUInt32LE(at + 4);
    const end = at + 8 + size + (size % 2);
    if (end > bytes.length) break;
    const name = bytes.subarray(at, at + 4).toString('latin1');
    if (name !== 'EXIF' && name !== 'XMP ') {
      const chunk = Buffer.from(bytes.subarray(at, end));
      if (name === 'VP8X') chunk[8] = chunk[8]! & ~0b0000_1100;
      kept.push(chunk);
    }
    at = end;
  }
  const body = Buffer.concat([...kept, bytes.subarray(at)]);
  const head = Buffer.from(bytes.subarray(0, 12));
  head.writeUInt32LE(4 + body.length, 4);
  return Buffer.concat([head, body]);
};
