import { createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Injectable } from '@nestjs/common';
import { Storage } from '../adapters/storage/storage.js';
import type { MeshFindings } from '../catalogue/files/measured-mesh.js';
import { MeshRunner, type MeshOutcome } from './mesh-runner.js';

export type Measured =
  | { readonly isMeasured: true; readonly findings: MeshFindings }
  | Extract<MeshOutcome, { isMeasured: false }>;

/** Measures meshes where they are stored, and stores the likeness that comes of it. */
@Injectable()
export class StoredMeshes {
  constructor(
    private readonly storage: Storage,
    private readonly runner: MeshRunner,
  ) {}

  async measure(storageKey: string, fileName: string): Promise<Measured> {
    const outcome = await this.run(storageKey, fileName);
    if (!outcome.isMeasured) return outcome;
    const { isMeasured, previewGlb, ...findings } = outcome;
    const { sha256, bytes } = await this.storage.putHashed(
      'previews',
      Readable.from([Buffer.from(previewGlb)]),
    );
    return { isMeasured, findings: { ...findings, preview: { sha256, bytes } } };
  }

  private async run(storageKey: string, fileName: string): Promise<MeshOutcome> {
    const path = this.storage.localPath(storageKey);
    if (path) return this.runner.run({ path, fileName });
    const folder = await mkdtemp(join(tmpdir(), 'windchest-mesh-'));
    try {
      const copy = join(folder, 'mesh');
      await pipeline(await this.storage.get(storageKey), createWriteStream(copy));
      return await this.runner.run({ path: copy, fileName });
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
  }
}
