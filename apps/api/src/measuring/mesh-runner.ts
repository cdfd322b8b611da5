import type { Comparison as MeshComparison } from '@windchest/meshes';
import type { MeshFindings } from '../catalogue/files/measured-mesh.js';

/** What a mesh gives, with its coarse likeness still in hand. */
export type MeshWork = Omit<MeshFindings, 'preview'> & { readonly previewGlb: Uint8Array };

export interface MeshTask {
  /** Where the bytes lie on this machine. */
  readonly path: string;
  readonly fileName: string;
}
/** Two meshes of one part. */
export interface MeshPairTask {
  readonly beforePath: string;
  readonly afterPath: string;
}

/** Why nothing came of a task; `fault` follows the name of what it was done to in a sentence. */
export interface MeshFault {
  readonly code: string;
  readonly fault: string;
}
export type MeshOutcome =
  ({ readonly isMeasured: true } & MeshWork) | ({ readonly isMeasured: false } & MeshFault);
export type MeshPairOutcome =
  | { readonly isCompared: true; readonly result: MeshComparison }
  | ({ readonly isCompared: false } & MeshFault);

/** Does the mesh work somewhere that cannot take the API down. */
export abstract class MeshRunner {
  /** Never throws for a file's sake: a bad file, a crash and a timeout are outcomes. */
  abstract run(task: MeshTask): Promise<MeshOutcome>;
  /** The same for comparing two. */
  abstract compare(task: MeshPairTask): Promise<MeshPairOutcome>;
  /** More work than threads: what can wait had better come back later than hold a place among the jobs. */
  abstract get isCrowded(): boolean;
  abstract close(): Promise<void>;
}
