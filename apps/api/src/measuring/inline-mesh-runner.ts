import { measureMesh } from './measure-mesh.js';
import { MeshRunner, type MeshOutcome, type MeshTask } from './mesh-runner.js';

/** Measures in the calling thread, where no compiled worker is at hand: tests that run from the sources. */
export class InlineMeshRunner extends MeshRunner {
  run(task: MeshTask): Promise<MeshOutcome> {
    return measureMesh(task);
  }

  close(): Promise<void> {
    return Promise.resolve();
  }
}
