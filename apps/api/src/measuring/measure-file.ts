import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { z } from 'zod';
import { measureFile } from '../catalogue/files/measure-file.job.js';
import { MeasurementRecords } from '../catalogue/files/measurement-records.js';
import { HandlesJob, type JobHandler } from '../jobs/job.js';
import { MeshRunner } from './mesh-runner.js';
import { StoredMeshes } from './stored-meshes.js';

/** After so many runs that ended without an answer a file counts as one that ends the process. */
const MOST_TRIES = 4;

/** Measures one stored mesh and keeps what was found. */
@Injectable()
@HandlesJob(measureFile)
export class MeasureFile implements JobHandler<typeof measureFile.payload>, OnApplicationShutdown {
  constructor(
    private readonly records: MeasurementRecords,
    private readonly meshes: StoredMeshes,
    private readonly runner: MeshRunner,
  ) {}

  async handle({ sha256, fileName }: z.output<typeof measureFile.payload>): Promise<void> {
    const work = await this.records.begin(sha256);
    if (!work) return;
    if (work.tries > MOST_TRIES)
      return this.records.keepRefused(
        sha256,
        'worker-ended',
        `could not be measured in ${MOST_TRIES} tries. Export it with fewer triangles.`,
      );
    const measured = await this.meshes.measure(work.storageKey, fileName);
    if (!measured.isMeasured) return this.records.keepRefused(sha256, measured.code, measured.fault);
    await this.records.keepMeasured(sha256, measured.findings);
  }

  onApplicationShutdown(): Promise<void> {
    return this.runner.close();
  }
}
