import type { Mesh } from './mesh.js';
import type { Refuse } from './mesh-error.js';

const HEADER_BYTES = 80;
const BODY_OFFSET = 84;
const TRIANGLE_BYTES = 50;
/** Zero bytes some exporters append to fill a disk block; anything else behind the body is a wrong count. */
const MAX_PADDING_BYTES = 4096;
const TEXT_PROBE_BYTES = 512;
const MAX_PLAUSIBLE_MM = 1e9;

/** The size rule of the format: 84 bytes and 50 for each triangle. The first word says nothing: many
 * binary files start with "solid". */
export function isBinaryStlSize(bytes: Uint8Array): boolean {
  return bytes.length >= BODY_OFFSET && bytes.length === BODY_OFFSET + TRIANGLE_BYTES * countOf(bytes);
}

export function looksLikeStlText(bytes: Uint8Array): boolean {
  const probe = bytes.subarray(0, TEXT_PROBE_BYTES);
  if (probe.includes(0)) return false;
  return /^\uFEFF?\s*solid\b/i.test(latin1(probe).replace(/^\xEF\xBB\xBF/, ''));
}

const SIGNATURES: readonly (readonly [RegExp, string])[] = [
  [/^\x89PNG/, 'a PNG picture'],
  [/^\xFF\xD8\xFF/, 'a JPEG picture'],
  [/^GIF8/, 'a GIF picture'],
  [/^%PDF-/, 'a PDF document'],
  [/^(RIFF|OggS|fLaC|ID3)/, 'sound or a WebP picture'],
  [/^ISO-10303-21/, 'a STEP file'],
  [/^\s*(<!doctype|<html|<\?xml)/i, 'HTML or XML text'],
];

/** Says what the bytes are when they carry the mark of another well-known kind of file, else null. */
export function recogniseOther(bytes: Uint8Array): string | null {
  const start = latin1(bytes.subarray(0, 64));
  return SIGNATURES.find(([mark]) => mark.test(start))?.[1] ?? null;
}

/**
 * Binary STL (3D Systems, 1989): 80 header bytes, a uint32 count, then 50 bytes a triangle, all
 * little-endian. Coordinates are taken as millimetres, since STL states no unit.
 *
 * @throws MeshError `not-an-stl`, `no-triangles`, `truncated`, `count-mismatch`, `too-many-triangles`,
 * `non-finite-coordinate`.
 */
export function readStlBinary(bytes: Uint8Array, maxTriangles: number, refuse: Refuse): Mesh {
  if (bytes.length < BODY_OFFSET || !isPlausibleBody(bytes)) {
    throw refuse('not-an-stl', 'is not an STL file: it is neither STL text nor a binary STL body.');
  }
  const triangles = countOf(bytes);
  requireWholeBody(bytes, triangles, refuse);
  if (triangles === 0) throw refuse('no-triangles', 'holds no triangles; export the part again.');
  if (triangles > maxTriangles) {
    throw refuse(
      'too-many-triangles',
      `holds ${triangles} triangles; at most ${maxTriangles} are read. Export it coarser.`,
    );
  }
  const corners = new Float32Array(9 * triangles);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  // Any NaN or infinity makes this sum NaN: one test for the whole file keeps the copy fast.
  let nonFinite = 0;
  let target = 0;
  for (let triangle = 0; triangle < triangles; triangle += 1) {
    const source = BODY_OFFSET + TRIANGLE_BYTES * triangle + 12;
    for (let k = 0; k < 36; k += 4) {
      const value = view.getFloat32(source + k, true);
      nonFinite += value * 0;
      corners[target] = value;
      target += 1;
    }
  }
  if (nonFinite !== 0) {
    const at = corners.findIndex((value) => !Number.isFinite(value));
    throw refuse(
      'non-finite-coordinate',
      `has a corner that is not a number (${corners[at]}) in triangle ${Math.floor(at / 9) + 1}; export it again.`,
    );
  }
  return { format: 'stl-binary', triangles, corners, statedUnit: null };
}

function requireWholeBody(bytes: Uint8Array, triangles: number, refuse: Refuse): void {
  const expected = BODY_OFFSET + TRIANGLE_BYTES * triangles;
  if (bytes.length === expected || isPadding(bytes, expected)) return;
  const whole = Math.floor((bytes.length - BODY_OFFSET) / TRIANGLE_BYTES);
  const stray = bytes.length - BODY_OFFSET - whole * TRIANGLE_BYTES;
  const counts = `its header says ${triangles} triangles, which need ${expected} bytes, but it has ${bytes.length} bytes`;
  if (stray > 0 && triangles > whole) {
    throw refuse(
      'truncated',
      `is cut off: ${counts} (${whole} whole triangles and ${stray} stray bytes). Copy or export it again.`,
    );
  }
  throw refuse(
    'count-mismatch',
    `has a wrong triangle count: ${counts} (room for ${whole}). Export it again.`,
  );
}

function isPadding(bytes: Uint8Array, from: number): boolean {
  const tail = bytes.length - from;
  return tail > 0 && tail <= MAX_PADDING_BYTES && bytes.subarray(from).every((byte) => byte === 0);
}

/** Random bytes read as floats soon give NaN or astronomic lengths; a real body does so only where broken. */
function isPlausibleBody(bytes: Uint8Array): boolean {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const whole = Math.floor((bytes.length - BODY_OFFSET) / TRIANGLE_BYTES);
  if (whole === 0) return countOf(bytes) < 1e7;
  const probes = Math.min(whole, 32);
  let absurd = 0;
  for (let triangle = 0; triangle < probes; triangle += 1) {
    for (let k = 12; k < 48; k += 4) {
      const value = view.getFloat32(BODY_OFFSET + TRIANGLE_BYTES * triangle + k, true);
      if (!(Math.abs(value) < MAX_PLAUSIBLE_MM)) absurd += 1;
    }
  }
  return absurd * 4 < probes * 9;
}

function countOf(bytes: Uint8Array): number {
  return new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength).getUint32(HEADER_BYTES, true);
}

function latin1(bytes: Uint8Array): string {
  return String.fromCharCode(...bytes);
}
