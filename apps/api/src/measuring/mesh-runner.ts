import type { MeshFindings } from '../catalogue/files/measured-mesh.js';

/** What a mesh gives, with its coarse likeness still in hand. */
export type MeshWork = Omit<MeshFindings, 'preview'> & { readonly previewGlb: Uint8Array };

export interface MeshTask {
  /** Where the bytes lie on this machine. */
  readonly path: string;
  readonly fileName: string;
}

/** What came of measuring; `fault` follows the file's name in a sentence. */
export type MeshOutcome =
  | ({ readonly isMeasured: true } & MeshWork)
  | { readonly isMeasured: false; readonly code: string; readonly fault: string };

/** Does the mesh work somewhere that cannot take the API down. */
export abstract class MeshRunner {
  /** Never throws for a file's sake: a bad file, a crash and a timeout are outcomes. */
  abstract run(task: MeshTask): Promise<MeshOutcome>;
  abstract close(): Promise<void>;
}
