import { compareMeshFiles } from './compare-mesh-files.js';
import { measureMesh } from './measure-mesh.js';

/** What a worker thread runs, by the name of the task. */
export { compareMeshFiles, measureMesh };
