import { readFile } from 'node:fs/promises';
import { compare, MeshError, readMesh, type Mesh } from '@windchest/meshes';
import type { MeshPairOutcome, MeshPairTask } from './mesh-runner.js';

/** Reads two meshes and compares them: the other work of a worker thread. */
export const compareMeshFiles = async ({ beforePath, afterPath }: MeshPairTask): Promise<MeshPairOutcome> => {
  try {
    // One after the other: the bytes of the first are let go before the second is read.
    const before = await readOne(beforePath, 'the earlier file');
    const after = await readOne(afterPath, 'the new file');
    return { isCompared: true, result: compare(before, after) };
  } catch (fault) {
    if (fault instanceof MeshError) return { isCompared: false, code: fault.code, fault: fault.message };
    if (fault instanceof RangeError && /allocation|length/i.test(fault.message))
      return {
        isCompared: false,
        code: 'out-of-memory',
        fault: 'comparing them needs more memory than there is.',
      };
    throw fault;
  }
};

const readOne = async (path: string, fileName: string): Promise<Mesh> =>
  readMesh(await readFile(path), { fileName });
