import { measureMesh } from './measure-mesh.js';

/** What a worker thread runs for each task. */
export default measureMesh;
