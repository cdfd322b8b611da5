import type { Refuse } from './mesh-error.js';

/** One entry of a zip archive as its central directory states it. */
export interface ZipEntry {
  readonly name: string;
  readonly method: number;
  readonly crc32: number;
  readonly packedBytes: number;
  readonly statedBytes: number;
  /** Where the entry's local header starts. */
  readonly offset: number;
}

const LOCAL_MARK = 0x04034b50;
const CENTRAL_MARK = 0x02014b50;
const END_MARK = 0x06054b50;
const ZIP64_LOCATOR_MARK = 0x07064b50;
const ZIP64_END_MARK = 0x06064b50;
const ZIP64_EXTRA = 0x0001;
const ZIP64_LOCATOR_BYTES = 20;
const ZIP64_END_BYTES = 56;
const ALL_ONES = 0xffffffff;
const END_BYTES = 22;
const MAX_COMMENT_BYTES = 0xffff;
const MAX_ENTRIES = 1000;
const NAME_IS_UTF8 = 0x0800;
const IS_ENCRYPTED = 0x0001;

export function looksLikeZip(bytes: Uint8Array): boolean {
  if (bytes.length < 4) return false;
  const mark = view(bytes).getUint32(0, true);
  return mark === LOCAL_MARK || mark === END_MARK;
}

/**
 * Reads the central directory of a zip archive (PKWARE APPNOTE 6.3, sections 4.3.12 to 4.3.16) without
 * inflating anything, and refuses what two readers could understand differently or what no model needs.
 *
 * @throws MeshError `not-a-zip`, `unsupported-zip`, `too-many-entries`, `duplicate-entry`, `unsafe-path`.
 */
export function readZipDirectory(bytes: Uint8Array, refuse: Refuse): ReadonlyMap<string, ZipEntry> {
  const data = view(bytes);
  const end = findEnd(bytes, data);
  if (end < 0)
    throw refuse('not-a-zip', 'is a damaged 3MF file: the zip archive is cut off. Copy or export it again.');
  const { count, size, start } = directoryPlace(data, end, refuse);
  if (count > MAX_ENTRIES) {
    throw refuse('too-many-entries', `holds ${count} zip entries; a 3MF file may hold ${MAX_ENTRIES} here.`);
  }
  if (start + size > end)
    throw refuse('not-a-zip', 'is a damaged 3MF file: its zip directory lies outside the file.');
  const entries = new Map<string, ZipEntry>();
  const seen = new Set<string>();
  let at = start;
  for (let i = 0; i < count; i += 1) {
    if (at + 46 > end || data.getUint32(at, true) !== CENTRAL_MARK) {
      throw refuse(
        'not-a-zip',
        `is a damaged 3MF file: entry ${i + 1} of ${count} of its zip directory is broken.`,
      );
    }
    const flags = data.getUint16(at + 8, true);
    const nameBytes = data.getUint16(at + 28, true);
    const name = decodeName(bytes.subarray(at + 46, at + 46 + nameBytes), (flags & NAME_IS_UTF8) !== 0);
    requireSafe(name, refuse);
    // OPC part names are compared without regard to case (ECMA-376 part 2, 6.2.2.3).
    const key = name.toLowerCase();
    if (seen.has(key)) {
      throw refuse('duplicate-entry', `holds “${name}” twice; readers would disagree on which one counts.`);
    }
    seen.add(key);
    if ((flags & IS_ENCRYPTED) !== 0) {
      throw refuse('unsupported-zip', `holds “${name}” encrypted; save it without a password.`);
    }
    entries.set(key, {
      name,
      method: data.getUint16(at + 10, true),
      crc32: data.getUint32(at + 16, true),
      ...wideFields(data, at, at + 46 + nameBytes),
    });
    at += 46 + nameBytes + data.getUint16(at + 30, true) + data.getUint16(at + 32, true);
  }
  return entries;
}

/** Number, bytes and place of the directory's entries; zip64 writes them in a second record. */
function directoryPlace(data: DataView, end: number, refuse: Refuse) {
  const locator = end - ZIP64_LOCATOR_BYTES;
  if (locator >= 0 && data.getUint32(locator, true) === ZIP64_LOCATOR_MARK) {
    const record = wide(data, locator + 8);
    if (record + ZIP64_END_BYTES > locator || data.getUint32(record, true) !== ZIP64_END_MARK) {
      throw refuse('not-a-zip', 'is a damaged 3MF file: its zip64 directory record is missing.');
    }
    return { count: wide(data, record + 32), size: wide(data, record + 40), start: wide(data, record + 48) };
  }
  if (data.getUint16(end + 4, true) !== 0) {
    throw refuse(
      'unsupported-zip',
      'is one volume of a split zip archive, which is not read; save it in one piece.',
    );
  }
  return {
    count: data.getUint16(end + 10, true),
    size: data.getUint32(end + 12, true),
    start: data.getUint32(end + 16, true),
  };
}

/** Sizes and place of an entry: fields full of ones stand, in this order, in the zip64 extra field (4.5.3). */
function wideFields(data: DataView, at: number, extra: number) {
  const extraEnd = Math.min(data.byteLength, extra + data.getUint16(at + 30, true));
  let next = extraEnd;
  let last = extraEnd;
  for (let field = extra; field + 4 <= extraEnd; field += 4 + data.getUint16(field + 2, true)) {
    if (data.getUint16(field, true) !== ZIP64_EXTRA) continue;
    next = field + 4;
    last = Math.min(extraEnd, next + data.getUint16(field + 2, true));
  }
  const read = (offset: number): number => {
    const value = data.getUint32(at + offset, true);
    if (value !== ALL_ONES || next + 8 > last) return value;
    next += 8;
    return wide(data, next - 8);
  };
  const statedBytes = read(24);
  const packedBytes = read(20);
  return { statedBytes, packedBytes, offset: read(42) };
}

/** A 64-bit count; beyond 2⁵³ it loses digits, but is then far outside any file. */
function wide(data: DataView, at: number): number {
  return data.getUint32(at, true) + data.getUint32(at + 4, true) * 2 ** 32;
}

/** The packed bytes of an entry, found through its local header. */
export function packedBytesOf(bytes: Uint8Array, entry: ZipEntry, refuse: Refuse): Uint8Array {
  const data = view(bytes);
  if (entry.offset + 30 > bytes.length || data.getUint32(entry.offset, true) !== LOCAL_MARK) {
    throw refuse('not-a-zip', `is a damaged 3MF file: “${entry.name}” is not where its zip directory says.`);
  }
  const start =
    entry.offset + 30 + data.getUint16(entry.offset + 26, true) + data.getUint16(entry.offset + 28, true);
  if (start + entry.packedBytes > bytes.length) {
    throw refuse('not-a-zip', `is a damaged 3MF file: “${entry.name}” runs over the end of the file.`);
  }
  return bytes.subarray(start, start + entry.packedBytes);
}

function findEnd(bytes: Uint8Array, data: DataView): number {
  const lowest = Math.max(0, bytes.length - END_BYTES - MAX_COMMENT_BYTES);
  for (let at = bytes.length - END_BYTES; at >= lowest; at -= 1) {
    if (
      data.getUint32(at, true) === END_MARK &&
      at + END_BYTES + data.getUint16(at + 20, true) <= bytes.length
    ) {
      return at;
    }
  }
  return -1;
}

function requireSafe(name: string, refuse: Refuse): void {
  const isUnsafe =
    name === '' ||
    name.includes('\\') ||
    name.startsWith('/') ||
    /^[a-z]:/i.test(name) ||
    // eslint-disable-next-line no-control-regex
    /[\u0000-\u001f]/.test(name) ||
    name.split('/').some((step) => step === '..' || step === '.');
  if (isUnsafe) {
    throw refuse('unsafe-path', `holds a zip entry with an unsafe path (“${name}”). Export it again.`);
  }
}

function decodeName(bytes: Uint8Array, isUtf8: boolean): string {
  const latin1 = String.fromCharCode(...bytes);
  if (!isUtf8) return latin1;
  try {
    return decodeURIComponent(latin1.replace(/[%\u0080-\u00ff]/g, (c) => `%${c.charCodeAt(0).toString(16)}`));
  } catch {
    return latin1;
  }
}

function view(bytes: Uint8Array): DataView {
  return new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
}
