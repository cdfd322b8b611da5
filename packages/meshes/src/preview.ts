import { coarsen, type CoarseMesh } from './coarsen.js';
import type { Mesh } from './mesh.js';

const MAX_TRIANGLES = 6000;
const GLB_MARK = 0x46546c67;
const JSON_CHUNK = 0x4e4f534a;
const BINARY_CHUNK = 0x004e4942;
const ARRAY_BUFFER = 34962;
const ELEMENT_ARRAY_BUFFER = 34963;
const UNSIGNED_BYTE = 5121;
const UNSIGNED_SHORT = 5123;

/**
 * A coarse picture of a part in three dimensions, as a binary glTF 2.0 file of at most 60 KB. It lies on a
 * lattice of at least 0.6 mm, with single bytes for coordinates (KHR_mesh_quantization), so that the
 * printable part cannot be had from it. Units are metres and y is up, as glTF wants; viewers compute flat
 * normals, since none are given (glTF 2.0, 3.7.2.1).
 */
export function preview(mesh: Mesh): Uint8Array {
  return writeGlb(coarsen(mesh.corners, MAX_TRIANGLES));
}

function writeGlb(coarse: CoarseMesh): Uint8Array {
  const count = coarse.points.length / 3;
  // Vertex attributes start at multiples of four bytes, so each point carries one byte of padding.
  const points = new Uint8Array(4 * count);
  for (let i = 0; i < count; i += 1) points.set(coarse.points.subarray(3 * i, 3 * i + 3), 4 * i);
  const indices = new Uint8Array(coarse.indices.buffer, coarse.indices.byteOffset, coarse.indices.byteLength);
  const json = textBytes(JSON.stringify(describe(coarse, points.length, indices.length)));
  const jsonLength = padded(json.length);
  const binaryLength = padded(points.length + indices.length);
  const glb = new Uint8Array(12 + 8 + jsonLength + 8 + binaryLength);
  const view = new DataView(glb.buffer);
  [GLB_MARK, 2, glb.length, jsonLength, JSON_CHUNK].forEach((word, i) => view.setUint32(4 * i, word, true));
  glb.fill(32, 20, 20 + jsonLength);
  glb.set(json, 20);
  view.setUint32(20 + jsonLength, binaryLength, true);
  view.setUint32(24 + jsonLength, BINARY_CHUNK, true);
  glb.set(points, 28 + jsonLength);
  glb.set(indices, 28 + jsonLength + points.length);
  return glb;
}

function describe({ points, indices, minMm, stepMm }: CoarseMesh, pointBytes: number, indexBytes: number) {
  const min = [255, 255, 255],
    max = [0, 0, 0];
  points.forEach((step, i) => {
    min[i % 3] = Math.min(min[i % 3]!, step);
    max[i % 3] = Math.max(max[i % 3]!, step);
  });
  return {
    asset: { version: '2.0', generator: 'Windchest preview' },
    extensionsUsed: ['KHR_mesh_quantization'],
    extensionsRequired: ['KHR_mesh_quantization'],
    scene: 0,
    scenes: [{ nodes: [0] }],
    nodes: [
      // A quarter turn about x brings z up to y; the scale turns mm into metres.
      { children: [1], rotation: [-Math.SQRT1_2, 0, 0, Math.SQRT1_2], scale: [0.001, 0.001, 0.001] },
      { mesh: 0, translation: minMm, scale: stepMm },
    ],
    materials: [
      {
        pbrMetallicRoughness: {
          baseColorFactor: [0.8, 0.8, 0.8, 1],
          metallicFactor: 0,
          roughnessFactor: 0.8,
        },
      },
    ],
    meshes: [{ primitives: [{ attributes: { POSITION: 0 }, indices: 1, material: 0 }] }],
    accessors: [
      { bufferView: 0, componentType: UNSIGNED_BYTE, count: points.length / 3, type: 'VEC3', min, max },
      { bufferView: 1, componentType: UNSIGNED_SHORT, count: indices.length, type: 'SCALAR' },
    ],
    bufferViews: [
      { buffer: 0, byteOffset: 0, byteLength: pointBytes, byteStride: 4, target: ARRAY_BUFFER },
      { buffer: 0, byteOffset: pointBytes, byteLength: indexBytes, target: ELEMENT_ARRAY_BUFFER },
    ],
    buffers: [{ byteLength: padded(pointBytes + indexBytes) }],
  };
}

function padded(bytes: number): number {
  return Math.ceil(bytes / 4) * 4;
}

/** The description is plain ASCII. */
function textBytes(text: string): Uint8Array {
  return Uint8Array.from(text, (letter) => letter.charCodeAt(0));
}
