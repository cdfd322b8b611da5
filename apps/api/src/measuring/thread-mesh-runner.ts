import { Piscina } from 'piscina';
import type { PassingFault } from '../catalogue/files/measurement-records.js';
import { MeshRunner, type MeshOutcome, type MeshTask } from './mesh-runner.js';

export interface ThreadOptions {
  /** The compiled module each thread runs. */
  readonly worker: URL;
  readonly threads: number;
  readonly timeoutMs: number;
  readonly maxHeapMb: number;
}

/** Measures in worker threads with a limit of memory and time; a thread that ends is replaced. */
export class ThreadMeshRunner extends MeshRunner {
  private readonly pool: Piscina<MeshTask, MeshOutcome>;
  private readonly timeoutMs: number;
  private free: number;
  private readonly waiting: (() => void)[] = [];

  constructor({ worker, threads, timeoutMs, maxHeapMb }: ThreadOptions) {
    super();
    this.timeoutMs = timeoutMs;
    this.free = threads;
    this.pool = new Piscina<MeshTask, MeshOutcome>({
      filename: worker.href,
      minThreads: 0,
      maxThreads: threads,
      // Idle threads go, and give back what a large mesh took.
      idleTimeout: 20_000,
      resourceLimits: { maxOldGenerationSizeMb: maxHeapMb },
    });
    // A thread may also end after its task was given up; without a listener that would end the process.
    this.pool.on('error', () => undefined);
  }

  async run(task: MeshTask): Promise<MeshOutcome> {
    // Waiting for a thread happens here, not in the pool: the time limit is for the work alone.
    await this.turn();
    const stop = new AbortController();
    const timer = setTimeout(() => stop.abort(), this.timeoutMs);
    try {
      return await this.pool.run(task, { signal: stop.signal });
    } catch (fault) {
      return outcomeOf(fault, stop.signal.aborted, this.timeoutMs);
    } finally {
      clearTimeout(timer);
      this.passOn();
    }
  }

  close(): Promise<void> {
    return this.pool.destroy();
  }

  private turn(): Promise<void> {
    if (this.free === 0) return new Promise((resolve) => this.waiting.push(resolve));
    this.free -= 1;
    return Promise.resolve();
  }

  private passOn(): void {
    const next = this.waiting.shift();
    if (next) next();
    else this.free += 1;
  }
}

const outcomeOf = (fault: unknown, isLate: boolean, timeoutMs: number): MeshOutcome => {
  const refused = (code: PassingFault, sentence: string): MeshOutcome => ({
    isMeasured: false,
    code,
    fault: sentence,
  });
  if (isLate)
    return refused(
      'timed-out',
      `takes longer than ${Math.round(timeoutMs / 1000)} s to measure. Export it with fewer triangles.`,
    );
  if ((fault as { code?: unknown }).code === 'ERR_WORKER_OUT_OF_MEMORY')
    return refused(
      'out-of-memory',
      'needs more memory to measure than one file may have. Export it with fewer triangles.',
    );
  const { message } = fault as { message?: unknown };
  const detail = typeof message === 'string' ? ` (${message})` : '';
  return refused(
    'worker-ended',
    `could not be measured: the measuring of it ended by itself${detail}. Send it again, or export it anew.`,
  );
};
