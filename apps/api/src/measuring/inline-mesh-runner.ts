import { compareMeshFiles } from './compare-mesh-files.js';
import { measureMesh } from './measure-mesh.js';
import {
  MeshRunner,
  type MeshOutcome,
  type MeshPairOutcome,
  type MeshPairTask,
  type MeshTask,
} from './mesh-runner.js';

/** Works in the calling thread, where no compiled worker is at hand: tests that run from the sources. */
export class InlineMeshRunner extends MeshRunner {
  run(task: MeshTask): Promise<MeshOutcome> {
    return measureMesh(task);
  }

  compare(task: MeshPairTask): Promise<MeshPairOutcome> {
    return compareMeshFiles(task);
  }

  get isCrowded(): boolean {
    return false;
  }

  close(): Promise<void> {
    return Promise.resolve();
  }
}
