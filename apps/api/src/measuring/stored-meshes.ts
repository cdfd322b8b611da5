import { Readable } from 'node:stream';
import { Injectable } from '@nestjs/common';
import { Storage } from '../adapters/storage/storage.js';
import type { MeshFindings } from '../catalogue/files/measured-mesh.js';
import { withLocalPaths } from './local-copy.js';
import { MeshRunner, type MeshFault } from './mesh-runner.js';

export type Measured =
  | { readonly isMeasured: true; readonly findings: MeshFindings }
  | ({ readonly isMeasured: false } & MeshFault);

/** Measures meshes where they are stored, and stores the likeness that comes of it. */
@Injectable()
export class StoredMeshes {
  constructor(
    private readonly storage: Storage,
    private readonly runner: MeshRunner,
  ) {}

  async measure(storageKey: string, fileName: string): Promise<Measured> {
    const outcome = await withLocalPaths(this.storage, [storageKey], ([path = '']) =>
      this.runner.run({ path, fileName }),
    );
    if (!outcome.isMeasured) return outcome;
    const { isMeasured, previewGlb, ...findings } = outcome;
    const glb = Readable.from([Buffer.from(previewGlb)]);
    const { sha256, bytes } = await this.storage.putHashed('previews', glb);
    return { isMeasured, findings: { ...findings, preview: { sha256, bytes } } };
  }
}
