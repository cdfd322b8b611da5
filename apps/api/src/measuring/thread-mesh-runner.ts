import { Piscina } from 'piscina';
import type { PassingFault } from '../catalogue/files/passing-faults.js';
import {
  MeshRunner,
  type MeshFault,
  type MeshOutcome,
  type MeshPairOutcome,
  type MeshPairTask,
  type MeshTask,
} from './mesh-runner.js';

export interface ThreadOptions {
  /** The compiled module each thread runs. */
  readonly worker: URL;
  readonly threads: number;
  readonly timeoutMs: number;
  readonly maxHeapMb: number;
}

/** Measures and compares in worker threads with a limit of memory and time; a thread that ends is replaced. */
export class ThreadMeshRunner extends MeshRunner {
  private readonly pool: Piscina<unknown, unknown>;
  private readonly timeoutMs: number;
  private free: number;
  private readonly waiting: (() => void)[] = [];

  constructor({ worker, threads, timeoutMs, maxHeapMb }: ThreadOptions) {
    super();
    this.timeoutMs = timeoutMs;
    this.free = threads;
    this.pool = new Piscina<unknown, unknown>({
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
    const done = await this.inThread<MeshOutcome>('measureMesh', task);
    return 'answer' in done ? done.answer : { isMeasured: false, ...measuringFault(done.cut) };
  }

  async compare(task: MeshPairTask): Promise<MeshPairOutcome> {
    const done = await this.inThread<MeshPairOutcome>('compareMeshFiles', task);
    return 'answer' in done ? done.answer : { isCompared: false, ...comparingFault(done.cut) };
  }

  private async inThread<Outcome>(
    name: 'measureMesh' | 'compareMeshFiles',
    task: unknown,
  ): Promise<{ answer: Outcome } | { cut: Cut }> {
    // Waiting for a thread happens here, not in the pool: the time limit is for the work alone.
    await this.turn();
    const stop = new AbortController();
    const timer = setTimeout(() => stop.abort(), this.timeoutMs);
    try {
      return { answer: (await this.pool.run(task, { name, signal: stop.signal })) as Outcome };
    } catch (fault) {
      return { cut: cutOf(fault, stop.signal.aborted, this.timeoutMs) };
    } finally {
      clearTimeout(timer);
      this.passOn();
    }
  }

  get isCrowded(): boolean {
    return this.waiting.length > 0;
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

/** How the work in a thread came to an end without an answer, and the limit or the fault in words. */
interface Cut {
  readonly code: PassingFault;
  readonly words: string;
}

const cutOf = (fault: unknown, isLate: boolean, timeoutMs: number): Cut => {
  if (isLate) return { code: 'timed-out', words: `${Math.round(timeoutMs / 1000)} s` };
  if ((fault as { code?: unknown }).code === 'ERR_WORKER_OUT_OF_MEMORY')
    return { code: 'out-of-memory', words: '' };
  const { message } = fault as { message?: unknown };
  return { code: 'worker-ended', words: typeof message === 'string' ? ` (${message})` : '' };
};

const measuringFault = ({ code, words }: Cut): MeshFault => {
  const sentences: Record<PassingFault, string> = {
    'timed-out': `takes longer than ${words} to measure. Export it with fewer triangles.`,
    'out-of-memory': 'needs more memory to measure than one file may have. Export it with fewer triangles.',
    'worker-ended': `could not be measured: the measuring of it ended by itself${words}. Send it again, or export it anew.`,
  };
  return { code, fault: sentences[code] };
};

const comparingFault = ({ code, words }: Cut): MeshFault => {
  const sentences: Record<PassingFault, string> = {
    'timed-out': `comparing the two files takes longer than ${words}. Export the part with fewer triangles.`,
    'out-of-memory':
      'comparing the two files needs more memory than they may have. Export the part with fewer triangles.',
    'worker-ended': `the comparing of the two files ended by itself${words}. Send the file again, or export it anew.`,
  };
  return { code, fault: sentences[code] };
};
