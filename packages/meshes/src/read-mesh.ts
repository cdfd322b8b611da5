import type { Mesh } from './mesh.js';
import { refuser, type Refuse } from './mesh-error.js';
import { boundsOf } from './bounds.js';
import { looksLikeZip } from './zip-directory.js';
import { read3mf } from './read-3mf.js';
import { readStlAscii } from './read-stl-ascii.js';
import { isBinaryStlSize, looksLikeStlText, readStlBinary, recogniseOther } from './read-stl-binary.js';

export interface ReadMeshOptions {
  /** Named in every error; its ending matters only to explain what was expected. */
  readonly fileName: string;
  /** Ceiling of triangles after components are expanded; the default keeps a 512 MiB upload readable. */
  readonly maxTriangles?: number;
}

const DEFAULT_MAX_TRIANGLES = 24_000_000;

/**
 * Reads STL (binary, ASCII) or 3MF bytes into a triangle soup in millimetres. The content decides the
 * format, not the name. Nothing is repaired, merged or left out.
 *
 * @throws MeshError with a code and a sentence that names the file and the fault.
 */
export function readMesh(bytes: Uint8Array, options: ReadMeshOptions): Mesh {
  const { fileName, maxTriangles = DEFAULT_MAX_TRIANGLES } = options;
  const refuse = refuser(fileName);
  const mesh = readByContent(bytes, fileName, maxTriangles, refuse);
  return requireSpace(mesh, refuse);
}

function readByContent(bytes: Uint8Array, fileName: string, maxTriangles: number, refuse: Refuse): Mesh {
  if (bytes.length === 0) throw refuse('empty', 'is empty (0 bytes); export it again.');
  if (looksLikeZip(bytes)) return read3mf(bytes, maxTriangles, refuse);
  if (fileName.toLowerCase().endsWith('.3mf')) {
    throw refuse('not-a-zip', 'is not a 3MF file: a 3MF file is a zip archive, and this is none.');
  }
  const other = recogniseOther(bytes);
  if (other !== null) {
    throw refuse('not-an-stl', `is not a mesh: its content is ${other}. Upload an STL or 3MF file.`);
  }
  if (!isBinaryStlSize(bytes) && looksLikeStlText(bytes)) return readStlAscii(bytes, maxTriangles, refuse);
  return readStlBinary(bytes, maxTriangles, refuse);
}

/** A mesh without extent on some axis encloses nothing, whatever else it is. */
function requireSpace(mesh: Mesh, refuse: Refuse): Mesh {
  const { minMm, maxMm } = boundsOf(mesh.corners);
  const flat = ['width', 'depth', 'height'].find((_, axis) => maxMm[axis] === minMm[axis]);
  if (flat !== undefined) {
    throw refuse(
      'no-volume',
      `is flat: its ${flat} is 0 mm, so it encloses no volume. Export it as a solid.`,
    );
  }
  return mesh;
}
