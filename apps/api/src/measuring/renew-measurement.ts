import { Injectable } from '@nestjs/common';
import type { z } from 'zod';
import { renewMeasurement } from '../catalogue/files/measure-file.job.js';
import { MeasurementRecords } from '../catalogue/files/measurement-records.js';
import { passingFaults } from '../catalogue/files/passing-faults.js';
import { HandlesJob, TryLater, type JobHandler } from '../jobs/job.js';
import { MeshRunner } from './mesh-runner.js';
import { StoredMeshes } from './stored-meshes.js';

/** Counted with those of its first measuring: a file that ends the process is not taken up for ever. */
const MOST_TRIES = 8;

/** Measures a mesh again that was measured by an older version; what cannot be measured now stays as it was. */
@Injectable()
@HandlesJob(renewMeasurement)
export class RenewMeasurement implements JobHandler<typeof renewMeasurement.payload> {
  constructor(
    private readonly records: MeasurementRecords,
    private readonly meshes: StoredMeshes,
    private readonly runner: MeshRunner,
  ) {}

  async handle({ sha256, fileName }: z.output<typeof renewMeasurement.payload>): Promise<void> {
    // What was measured before still serves; new uploads go first.
    if (this.runner.isCrowded) throw new TryLater(1);
    const work = await this.records.beginRenewal(sha256);
    if (!work) return;
    if (work.tries > MOST_TRIES) return this.records.keepRenewed(sha256, null);
    const measured = await this.meshes.measure(work.storageKey, fileName);
    if (measured.isMeasured) return this.records.keepRenewed(sha256, measured.findings);
    // A fault of the measuring, not of the file: the job is tried again later.
    if ((passingFaults as readonly string[]).includes(measured.code))
      throw new Error(`“${fileName}” ${measured.fault}`);
    await this.records.keepRenewed(sha256, null);
  }
}
