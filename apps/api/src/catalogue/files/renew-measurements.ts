import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { Transactions } from '../../database/transactions.js';
import { HandlesJob, type Finish, type JobHandler } from '../../jobs/job.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { renewMeasurements } from './measure-file.job.js';
import { MEASURER_VERSION, MeasurementRecords } from './measurement-records.js';

/**
 * After an upgrade with a newer measurer everything measured before is measured again, also what stands in
 * released revisions: their files, parts and bundles stay as they are, only what is known of the meshes grows.
 */
@Injectable()
@HandlesJob(renewMeasurements)
export class RenewMeasurements
  implements JobHandler<typeof renewMeasurements.payload>, OnApplicationBootstrap
{
  constructor(
    private readonly transactions: Transactions,
    private readonly records: MeasurementRecords,
    private readonly queue: JobQueue,
  ) {}

  /** Of all processes and starts, the first of this version writes the job. */
  async onApplicationBootstrap(): Promise<void> {
    const version = MEASURER_VERSION;
    await this.transactions.run((tx) =>
      this.queue.add(tx, renewMeasurements, { version }, { key: `measurer-${version}` }),
    );
  }

  async handle(): Promise<Finish> {
    const meshes = await this.records.outdated();
    return (tx) => this.records.addRenewals(tx, meshes);
  }
}
