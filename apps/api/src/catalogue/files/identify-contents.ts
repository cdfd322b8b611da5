import type { FileKind } from './file-kind.js';

/** What was seen of a file while it went by. */
export interface Glimpse {
  readonly bytes: number;
  /** The first 4 KiB, or all of it. */
  readonly head: Buffer;
  /** The last 256 KiB, or all of it. */
  readonly tail: Buffer;
  /** Whether every byte belongs to readable UTF-8 text. */
  readonly isText: boolean;
}

/** The kind of contents, or what they are that is not taken. */
export type Identity =
  | { readonly kind: FileKind }
  | { readonly kind: null; readonly isNothingKnown?: boolean; readonly fault: string };

const STL_HEADER_BYTES = 84;
const STL_TRIANGLE_BYTES = 50;
const ONE_BY_ONE = 'Unpack it and send the files one by one.';

/** Tells what a file is from its bytes alone. */
export const identifyContents = (glimpse: Glimpse): Identity => {
  const { bytes, head } = glimpse;
  if (bytes === 0) return { kind: null, fault: 'is empty (0 bytes). Export it again.' };
  // A mesh header may hold any 80 bytes, also such that look like something else: size decides first.
  if (isBinaryStl(bytes, head)) return { kind: 'stl' };
  const signed = bySignature(head);
  if (signed) return { kind: signed };
  if (starts(head, 'PK')) return zipIdentity(glimpse);
  const refused = refusedSignature(head);
  if (refused) return { kind: null, fault: `is ${refused}. Windchest takes no such files.` };
  if (glimpse.isText) return textIdentity(head.toString('utf8'));
  return {
    kind: null,
    isNothingKnown: true,
    fault:
      'is none of the kinds that are taken: STL, 3MF, STEP, PDF, text, PNG, JPEG, WebP, WAV, MP3, Ogg or FLAC.',
  };
};

const isBinaryStl = (bytes: number, head: Buffer): boolean =>
  bytes >= STL_HEADER_BYTES &&
  bytes === STL_HEADER_BYTES + STL_TRIANGLE_BYTES * head.readUInt32LE(STL_HEADER_BYTES - 4);

const starts = (head: Buffer, signature: string, offset = 0): boolean =>
  head.subarray(offset, offset + signature.length).toString('latin1') === signature;

const bySignature = (head: Buffer): FileKind | null => {
  if (starts(head, '%PDF-')) return 'pdf';
  if (starts(head, '\x89PNG\r\n\x1a\n')) return 'png';
  if (starts(head, '\xff\xd8\xff')) return 'jpeg';
  if (starts(head, 'RIFF') && starts(head, 'WEBP', 8)) return 'webp';
  if (starts(head, 'RIFF') && starts(head, 'WAVE', 8)) return 'wav';
  if (starts(head, 'OggS')) return 'ogg';
  if (starts(head, 'fLaC')) return 'flac';
  if (starts(head, 'ID3') || isMpegAudioFrame(head)) return 'mp3';
  if (starts(head, 'ISO-10303-21')) return 'step';
  return null;
};

/** Frame header of MPEG audio layer III (ISO/IEC 11172-3, 2.4.1.3): sync, version, layer, valid rates. */
const isMpegAudioFrame = (head: Buffer): boolean => {
  if (head.length < 4 || head[0] !== 0xff) return false;
  const [second, third] = [head[1]!, head[2]!];
  const isLayer3 = (second & 0xe0) === 0xe0 && (second & 0x18) !== 0x08 && (second & 0x06) === 0x02;
  return isLayer3 && third >> 4 !== 0 && third >> 4 !== 15 && (third & 0x0c) !== 0x0c;
};

const refusedSignature = (head: Buffer): string | null => {
  if (starts(head, 'MZ')) return 'a program for Windows';
  if (starts(head, '\x7fELF')) return 'a program';
  if (['\xcf\xfa\xed\xfe', '\xce\xfa\xed\xfe', '\xca\xfe\xba\xbe'].some((mark) => starts(head, mark)))
    return 'a program';
  if (starts(head, 'Rar!')) return 'a RAR archive';
  if (starts(head, '7z\xbc\xaf\x27\x1c')) return 'a 7z archive';
  if (starts(head, '\x1f\x8b')) return 'a gzip archive';
  if (starts(head, 'GIF8')) return 'a GIF picture; send it as PNG';
  return null;
};

const textIdentity = (start: string): Identity => {
  const text = start.replace(/^\ufeff/, '').trimStart();
  if (/^solid\b[\s\S]*\bfacet\s+normal\b/i.test(text)) return { kind: 'stl' };
  if (text.startsWith('#!'))
    return { kind: null, fault: 'is a program script. Windchest takes no programs.' };
  const markup = text.replace(/^(<\?xml[^>]*>|<!--[\s\S]*?-->|\s+)+/i, '');
  if (/^<(!doctype\s+)?svg\b/i.test(markup))
    return { kind: null, fault: 'is an SVG drawing, which can carry programs. Send it as PDF or PNG.' };
  if (/^<(!doctype\b|html\b|head\b|body\b|script\b|iframe\b)/i.test(markup))
    return { kind: null, fault: 'is a web page, which can carry programs. Send it as PDF or plain text.' };
  if (text.startsWith('<?xml'))
    return { kind: null, fault: 'is an XML file, which is none of the kinds that are taken.' };
  return { kind: 'text' };
};

const CENTRAL_ENTRY = Buffer.from('PK\x01\x02', 'latin1');
const END_OF_DIRECTORY = Buffer.from('PK\x05\x06', 'latin1');

/** A 3MF file is a zip that holds a 3D model; the measuring room judges everything else about it. */
const zipIdentity = ({ tail }: Glimpse): Identity => {
  const end = tail.lastIndexOf(END_OF_DIRECTORY);
  if (end < 0 || end + 22 > tail.length)
    return {
      kind: null,
      isNothingKnown: true,
      fault: 'is a zip archive that breaks off: the directory at its end is missing. Export it again.',
    };
  const directoryBytes = tail.readUInt32LE(end + 12);
  if (directoryBytes > end)
    return {
      kind: null,
      isNothingKnown: true,
      fault: `is a zip archive with very many files in it. ${ONE_BY_ONE}`,
    };
  return entryNames(tail).some((name) => /\.model$/i.test(name))
    ? { kind: '3mf' }
    : { kind: null, fault: `is a zip archive, not a 3MF file: there is no 3D model in it. ${ONE_BY_ONE}` };
};

/** Names in the zip directory, as far as it lies in the tail (PKWARE APPNOTE 4.3.12). */
const entryNames = (tail: Buffer): string[] => {
  const names: string[] = [];
  for (let at = tail.indexOf(CENTRAL_ENTRY); at >= 0; at = tail.indexOf(CENTRAL_ENTRY, at + 46)) {
    if (at + 46 > tail.length) break;
    names.push(tail.subarray(at + 46, at + 46 + tail.readUInt16LE(at + 28)).toString('utf8'));
  }
  return names;
};
