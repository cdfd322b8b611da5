import { existsSync } from 'node:fs';
import { Injectable } from '@nestjs/common';
import { Piscina } from 'piscina';
import type { z } from 'zod';
import { estimatePrint } from '../catalogue/print/estimate-print.job.js';
import { PrintPlans, type KitEstimate, type PrintPlan } from '../catalogue/print/print-plans.js';
import { HandlesJob, type Finish, type JobHandler } from '../jobs/job.js';
import { estimateKit } from './estimate-kit.js';

const worker = new URL('./estimate-worker.js', import.meta.url);

/** Estimates a released revision in a thread of its own, so that the API goes on answering. */
@Injectable()
@HandlesJob(estimatePrint)
export class EstimatePrint implements JobHandler<typeof estimatePrint.payload> {
  constructor(private readonly plans: PrintPlans) {}

  async handle({ revisionId }: z.output<typeof estimatePrint.payload>): Promise<Finish | void> {
    const plan = await this.plans.planOf(revisionId);
    if (!plan) return;
    const estimate = await inThread(plan);
    return (tx) => this.plans.keep(tx, revisionId, estimate);
  }
}

const inThread = async (plan: PrintPlan): Promise<KitEstimate | null> => {
  // Where nothing is compiled (tests run from the sources) the calling thread does it.
  if (!existsSync(worker)) return estimateKit(plan);
  const pool = new Piscina<PrintPlan, KitEstimate | null>({ filename: worker.href, maxThreads: 1 });
  try {
    return await pool.run(plan);
  } finally {
    await pool.destroy();
  }
};
