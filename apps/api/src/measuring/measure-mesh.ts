import { readFile } from 'node:fs/promises';
import { geometryHash, measure, MeshError, outlines, preview, readMesh, type Mesh } from '@windchest/meshes';
import { footprintOf, profileOf } from '@windchest/plates';
import type { Drawing, Drawings } from '../catalogue/files/measured-mesh.js';
import type { MeshOutcome, MeshTask } from './mesh-runner.js';

/** Reads, measures and draws one mesh: the work of a worker thread. */
export const measureMesh = async ({ path, fileName }: MeshTask): Promise<MeshOutcome> => {
  try {
    const mesh = readMesh(await readFile(path), { fileName });
    return {
      isMeasured: true,
      measurement: measure(mesh),
      geometryHash: geometryHash(mesh),
      drawings: drawingsOf(mesh),
      printProfile: profileOf(mesh),
      footprint: footprintOf(mesh),
      previewGlb: preview(mesh),
    };
  } catch (fault) {
    if (fault instanceof MeshError)
      return { isMeasured: false, code: fault.code, fault: withoutName(fault.message, fileName) };
    if (fault instanceof RangeError && /allocation|length/i.test(fault.message))
      return {
        isMeasured: false,
        code: 'out-of-memory',
        fault: 'needs more memory to measure than there is.',
      };
    throw fault;
  }
};

const drawingsOf = (mesh: Mesh): Drawings => {
  const { front, side, top } = outlines(mesh);
  return { front: toDrawing(front), side: toDrawing(side), top: toDrawing(top) };
};

const toDrawing = (view: ReturnType<typeof outlines>['front']): Drawing => ({
  path: view.path,
  edges: view.edges,
  widthMm: view.widthMm,
  heightMm: view.heightMm,
  viewBox: view.viewBox,
});

/** The same bytes may have several names, so the sentence is kept without one. */
const withoutName = (sentence: string, fileName: string): string => {
  const start = `“${fileName}” `;
  return sentence.startsWith(start) ? sentence.slice(start.length) : sentence;
};
