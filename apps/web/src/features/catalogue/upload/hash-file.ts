import type { HashAnswer, HashQuestion } from './hash.worker.js';

interface Waiting {
  onProgress: (done: number) => void;
  resolve: (sha256: string) => void;
  reject: (reason: Error) => void;
}

const waiting = new Map<number, Waiting>();
let worker: Worker | undefined;
let isWorkerBroken = false;
let questions = 0;

function onAnswer({ data }: MessageEvent<HashAnswer>): void {
  const one = waiting.get(data.id);
  if (!one) return;
  if ('done' in data) return one.onProgress(data.done);
  waiting.delete(data.id);
  if ('sha256' in data) one.resolve(data.sha256);
  else one.reject(new Error('The file cannot be read.'));
}

function startWorker(): Worker {
  const started = new Worker(new URL('./hash.worker.ts', import.meta.url), { type: 'module' });
  started.onmessage = onAnswer;
  started.onerror = () => {
    isWorkerBroken = true;
    started.terminate();
    for (const one of waiting.values()) one.reject(new WorkerBroke());
    waiting.clear();
  };
  return started;
}

class WorkerBroke extends Error {}

const hashHere = async (file: File, onProgress: (done: number) => void): Promise<string> =>
  (await import('./sha256-of.js')).sha256Of(file, onProgress);

/** SHA-256 of a file in small hex, worked out in a worker; where none can be started, here, piece by piece. */
export async function hashFile(file: File, onProgress: (done: number) => void): Promise<string> {
  if (isWorkerBroken || typeof Worker === 'undefined') return hashHere(file, onProgress);
  worker ??= startWorker();
  const question: HashQuestion = { id: ++questions, file };
  try {
    return await new Promise<string>((resolve, reject) => {
      waiting.set(question.id, { onProgress, resolve, reject });
      worker?.postMessage(question);
    });
  } catch (thrown) {
    if (thrown instanceof WorkerBroke) return hashHere(file, onProgress);
    throw thrown;
  }
}
