import { Inflate } from 'fflate';
import { crc32 } from './crc32.js';
import { MeshError, type Refuse } from './mesh-error.js';
import { packedBytesOf, type ZipEntry } from './zip-directory.js';

const STORED = 0;
const DEFLATED = 8;
const CHUNK_BYTES = 16 * 1024;
const MAX_INFLATED_BYTES = 2 ** 31;
/** XML of vertices packs 5:1 to 15:1; very regular meshes reach 60:1. A bomb is near 1000:1. */
const MAX_RATIO = 200;
/** Below this, a high ratio is harmless and happens with short, regular parts. */
const RATIO_FREE_BYTES = 1024 * 1024;

/** How many bytes may still be inflated from this archive, over all its entries together. */
export interface InflateBudget {
  leftBytes: number;
}

export function newInflateBudget(): InflateBudget {
  return { leftBytes: MAX_INFLATED_BYTES };
}

/** Refuses an archive any entry of which states an absurd size, before anything is inflated. */
export function requireModestRatios(entries: Iterable<ZipEntry>, refuse: Refuse): void {
  let total = 0;
  for (const entry of entries) {
    total += entry.statedBytes;
    if (isBomb(entry.statedBytes, entry.packedBytes)) throw tooFar(entry, refuse);
    if (total > MAX_INFLATED_BYTES) throw tooFar(entry, refuse);
  }
}

/**
 * Inflates one entry piece by piece. Bytes are counted while they come, whatever the directory states, and
 * the CRC-32 is checked at the end.
 *
 * @throws MeshError `inflates-too-far`, `crc`, `unsupported-zip`, `not-a-zip`.
 */
export function inflateEntry(
  archive: Uint8Array,
  entry: ZipEntry,
  budget: InflateBudget,
  onPiece: (piece: Uint8Array) => void,
  refuse: Refuse,
): void {
  const packed = packedBytesOf(archive, entry, refuse);
  let checksum = 0;
  let inflated = 0;
  const take = (piece: Uint8Array): void => {
    inflated += piece.length;
    budget.leftBytes -= piece.length;
    if (budget.leftBytes < 0 || isBomb(inflated, packed.length)) throw tooFar(entry, refuse);
    checksum = crc32(piece, checksum);
    if (piece.length > 0) onPiece(piece);
  };
  if (entry.method === STORED) take(packed);
  else if (entry.method === DEFLATED) inflatePieces(packed, take, entry, refuse);
  else
    throw refuse(
      'unsupported-zip',
      `packs “${entry.name}” in a way (${entry.method}) that is not read; zip it with deflate.`,
    );
  if (inflated !== entry.statedBytes || checksum !== entry.crc32) {
    throw refuse('crc', `is damaged: “${entry.name}” does not match its checksum. Copy or export it again.`);
  }
}

function inflatePieces(
  packed: Uint8Array,
  take: (piece: Uint8Array) => void,
  entry: ZipEntry,
  refuse: Refuse,
): void {
  let isFinished = false;
  const inflate = new Inflate((piece, isFinal) => {
    take(piece);
    isFinished ||= isFinal;
  });
  try {
    for (let at = 0; at < packed.length || at === 0; at += CHUNK_BYTES) {
      inflate.push(packed.subarray(at, at + CHUNK_BYTES), at + CHUNK_BYTES >= packed.length);
    }
  } catch (error) {
    if (error instanceof MeshError) throw error;
    throw refuse('crc', `is damaged: “${entry.name}” cannot be unpacked. Copy or export it again.`);
  }
  if (!isFinished)
    throw refuse('crc', `is damaged: “${entry.name}” ends too early. Copy or export it again.`);
}

function isBomb(inflatedBytes: number, packedBytes: number): boolean {
  return inflatedBytes > RATIO_FREE_BYTES && inflatedBytes > MAX_RATIO * packedBytes;
}

function tooFar(entry: ZipEntry, refuse: Refuse): MeshError {
  return refuse(
    'inflates-too-far',
    `is refused: “${entry.name}” grows far beyond what a model needs when unpacked (more than ${MAX_RATIO} times, or 2 GiB in all).`,
  );
}
