import { crc32, deflateSync } from 'node:zlib';
import { pictureTypeOf } from './picture-kind.js';
import { withoutMetadata } from './without-metadata.js';

const PLACE = 'GPS 53.3 N 6.2 W';
const segment = (marker: number, data: string): Buffer => {
  const body = Buffer.from(data, 'latin1');
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
};
const pngChunk = (name: string, data: Buffer): Buffer => {
  const named = Buffer.concat([Buffer.from(name, 'latin1'), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const sum = Buffer.alloc(4);
  sum.writeUInt32BE(crc32(named));
  return Buffer.concat([length, named, sum]);
};
const riffChunk = (name: string, data: Buffer): Buffer => {
  const head = Buffer.alloc(8);
  head.write(name, 'latin1');
  head.writeUInt32LE(data.length, 4);
  return Buffer.concat([head, data, Buffer.alloc(data.length % 2)]);
};

describe('a picture that somebody sent', () => {
  it('keeps a JPEG’s image and loses its Exif and comments', () => {
    const image = Buffer.concat([segment(0xda, 'scan'), Buffer.from([1, 2, 3, 0xff, 0xd9])]);
    const sent = Buffer.concat([
      Buffer.from([0xff, 0xd8]),
      segment(0xe0, 'JFIF'),
      segment(0xe1, `Exif ${PLACE}`),
      segment(0xfe, 'shot at home'),
      segment(0xdb, 'quantization'),
      image,
    ]);
    const kept = withoutMetadata(sent, 'image/jpeg');
    expect(kept).toEqual(
      Buffer.concat([Buffer.from([0xff, 0xd8]), segment(0xe0, 'JFIF'), segment(0xdb, 'quantization'), image]),
    );
  });

  it('keeps a PNG’s image and loses its words', () => {
    const signature = Buffer.from('\x89PNG\r\n\x1a\n', 'latin1');
    const [header, image, end] = [
      pngChunk('IHDR', Buffer.alloc(13)),
      pngChunk('IDAT', deflateSync(Buffer.alloc(4))),
      pngChunk('IEND', Buffer.alloc(0)),
    ];
    const sent = Buffer.concat([signature, header, pngChunk('tEXt', Buffer.from(PLACE)), image, end]);
    expect(pictureTypeOf(sent)).toBe('image/png');
    expect(withoutMetadata(sent, 'image/png')).toEqual(Buffer.concat([signature, header, image, end]));
  });

  it('keeps a WebP’s image, loses its Exif, and says so in its header', () => {
    const chunks = (flags: number, ...more: Buffer[]): Buffer => {
      const header = Buffer.alloc(10);
      header[0] = flags;
      const body = Buffer.concat([
        riffChunk('VP8X', header),
        riffChunk('VP8 ', Buffer.from('image')),
        ...more,
      ]);
      const head = Buffer.from('RIFF\0\0\0\0WEBP', 'latin1');
      head.writeUInt32LE(4 + body.length, 4);
      return Buffer.concat([head, body]);
    };
    const sent = chunks(0b0001_1000, riffChunk('EXIF', Buffer.from(PLACE)));
    expect(pictureTypeOf(sent)).toBe('image/webp');
    expect(withoutMetadata(sent, 'image/webp')).toEqual(chunks(0b0001_0000));
  });

  it('is none when it is something else', () => {
    expect(pictureTypeOf(Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'))).toBeNull();
    expect(pictureTypeOf(Buffer.from('GIF89a'))).toBeNull();
  });

  it('comes back whole where its blocks end too early', () => {
    const cut = Buffer.concat([Buffer.from([0xff, 0xd8]), segment(0xe0, 'JFIF').subarray(0, 6)]);
    expect(withoutMetadata(cut, 'image/jpeg')).toEqual(cut);
  });
});
