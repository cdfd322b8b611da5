import { randomUUID } from 'node:crypto';
import {
  Injectable,
  Logger,
  type BeforeApplicationShutdown,
  type OnApplicationBootstrap,
} from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { JobBell } from './job-bell.js';
import { JobRegistry } from './job-registry.js';
import { TryLater, type Finish } from './job.js';

/** While an upgrade goes round, a process of the old version meets jobs that only the new one knows. */
const UNKNOWN_ATTEMPTS = 10;

interface ClaimedJob {
  id: string;
  name: string;
  payload: unknown;
  attempts: number;
}

/**
 * Claims jobs under a lease, works outside the claim and finishes in a second short transaction.
 * A process that dies leaves its lease to run out; the job is then claimed again.
 */
@Injectable()
export class JobWorker implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private readonly log = new Logger('Jobs');
  private readonly workerId = `${process.pid}-${randomUUID().slice(0, 8)}`;
  private readonly underWay = new Set<Promise<void>>();
  private isStopping = false;
  private timer: NodeJS.Timeout | undefined;
  private stopListening: (() => void) | undefined;
  private isClaiming = false;

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly registry: JobRegistry,
    private readonly clock: Clock,
    private readonly bell: JobBell,
  ) {}

  onApplicationBootstrap(): void {
    if (this.config.JOB_CONCURRENCY === 0) return;
    this.timer = setInterval(() => void this.fill(), this.config.JOB_POLL_MS);
    this.stopListening = this.bell.onRing(() => void this.fill());
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.isStopping = true;
    clearInterval(this.timer);
    this.stopListening?.();
    while (this.isClaiming) await new Promise((resolve) => setTimeout(resolve, 5));
    await Promise.allSettled(this.underWay);
  }

  /** Runs everything that is due, until nothing is; for tests and commands that do not poll. */
  async drain(): Promise<number> {
    let count = 0;
    for (;;) {
      const jobs = await this.claim(10);
      if (jobs.length === 0) return count;
      for (const job of jobs) await this.run(job);
      count += jobs.length;
    }
  }

  private async fill(): Promise<void> {
    if (this.isClaiming || this.isStopping) return;
    const free = this.config.JOB_CONCURRENCY - this.underWay.size;
    if (free <= 0) return;
    this.isClaiming = true;
    try {
      const jobs = await this.claim(free);
      for (const job of jobs) {
        const work = this.run(job).finally(() => {
          this.underWay.delete(work);
          void this.fill();
        });
        this.underWay.add(work);
      }
    } catch (fault) {
      if (!this.isStopping) this.log.error(`Claiming failed: ${(fault as Error).message}`);
    } finally {
      this.isClaiming = false;
    }
  }

  private claim(limit: number): Promise<ClaimedJob[]> {
    const now = this.clock.now();
    return this.transactions.run(async (tx) => {
      // Dead leases first. Sequelize drops `skipLocked` for this dialect, hence the written query.
      const due = await selectRows<ClaimedJob>(
        this.database,
        `(SELECT id, name, payload, attempts FROM jobs WHERE state = 'running' AND leased_until < :now ORDER BY leased_until LIMIT :limit FOR UPDATE SKIP LOCKED)
         UNION ALL
         (SELECT id, name, payload, attempts FROM jobs WHERE state = 'queued' AND run_at <= :now ORDER BY run_at, id LIMIT :limit FOR UPDATE SKIP LOCKED)`,
        { now, limit },
        tx,
      );
      const jobs = due.slice(0, limit);
      if (jobs.length === 0) return [];
      await touchRows(
        this.database,
        `UPDATE jobs SET state = 'running', attempts = attempts + 1, leased_by = :worker, leased_until = :until WHERE id IN (:ids)`,
        { worker: this.workerId, until: this.leaseEnd(), ids: jobs.map((job) => job.id) },
        tx,
      );
      return jobs.map((job) => ({ ...job, attempts: Number(job.attempts) + 1 }));
    }, 'read-committed');
  }

  private leaseEnd(): Date {
    return this.clock.in(this.config.JOB_LEASE_SECONDS);
  }

  private async run(job: ClaimedJob): Promise<void> {
    const known = this.registry.find(job.name);
    const beat = setInterval(() => void this.renew(job), (this.config.JOB_LEASE_SECONDS * 1000) / 3);
    try {
      if (!known) throw new Error(`This version knows no job ${job.name}.`);
      const payload: unknown = typeof job.payload === 'string' ? JSON.parse(job.payload) : job.payload;
      const finish = await known.handler.handle(known.definition.payload.parse(payload));
      await this.finish(job, finish);
    } catch (fault) {
      await this.fail(
        job,
        fault,
        known?.definition.attempts ?? UNKNOWN_ATTEMPTS,
        known?.definition.retryAfterSeconds ?? (() => 60),
      );
    } finally {
      clearInterval(beat);
    }
  }

  private async renew(job: ClaimedJob): Promise<void> {
    try {
      await touchRows(
        this.database,
        `UPDATE jobs SET leased_until = :until WHERE id = :id AND state = 'running' AND leased_by = :worker`,
        {
          until: this.leaseEnd(),
          id: job.id,
          worker: this.workerId,
        },
      );
    } catch {
      // A missed renewal is mended by the next one, or the lease runs out and another worker takes over.
    }
  }

  private async finish(job: ClaimedJob, finish: Finish | void): Promise<void> {
    await this.transactions.run(async (tx) => {
      const mine = await touchRows(
        this.database,
        `UPDATE jobs SET state = 'done', finished_at = :now, leased_until = NULL, last_error = NULL WHERE id = :id AND state = 'running' AND leased_by = :worker`,
        { now: this.clock.now(), id: job.id, worker: this.workerId },
        tx,
      );
      // Whoever took the job over after a lost lease finishes it instead.
      if (mine === 1 && finish) await finish(tx);
    });
  }

  private async fail(
    job: ClaimedJob,
    fault: unknown,
    attempts: number,
    retryAfterSeconds: (failures: number) => number,
  ): Promise<void> {
    const isLater = fault instanceof TryLater;
    const isDead = !isLater && job.attempts >= attempts;
    const message = fault instanceof Error ? fault.message : String(fault);
    if (!isLater)
      this.log.warn(
        `Job ${job.name} ${job.id} failed (try ${job.attempts}${isDead ? ', now dead' : ''}): ${message}`,
      );
    await touchRows(
      this.database,
      `UPDATE jobs SET state = :state, run_at = :runAt, attempts = :attempts, leased_until = NULL, last_error = :message
       WHERE id = :id AND state = 'running' AND leased_by = :worker`,
      {
        state: isDead ? 'dead' : 'queued',
        runAt: this.clock.in(isLater ? fault.seconds : retryAfterSeconds(job.attempts)),
        attempts: isLater ? job.attempts - 1 : job.attempts,
        message: message.slice(0, 2000),
        id: job.id,
        worker: this.workerId,
      },
    ).catch((lost: unknown) =>
      this.log.error(`Job ${job.id} could not be put back: ${(lost as Error).message}`),
    );
  }
}
