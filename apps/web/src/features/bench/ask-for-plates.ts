import type { PlatesAnswer, PlatesQuestion } from './plates-work.js';
import type { PlatesMessage } from './plates.worker.js';

export interface PlatesEars {
  onProgress: (done: number) => void;
  onAnswer: (answer: PlatesAnswer) => void;
  /** A sentence about what was asked. */
  onRefusal: (sentence: string) => void;
}

/**
 * Has plates worked out in a worker of their own; where none can be started, here. One worker for each question:
 * starting it costs a moment, and ending it is the one way to break packing off.
 * @returns breaks the work off
 */
export function askForPlates(question: PlatesQuestion, ears: PlatesEars): () => void {
  let isGone = false;
  const hear = (message: PlatesMessage) => {
    if (isGone) return;
    if ('done' in message) ears.onProgress(message.done);
    else if ('answer' in message) ears.onAnswer(message.answer);
    else ears.onRefusal(message.refusal);
  };
  const workHere = async () => {
    const [{ workOutPlates }, { PlatesError }] = await Promise.all([
      import('./plates-work.js'),
      import('@windchest/plates'),
    ]);
    try {
      if (!isGone) hear({ answer: workOutPlates(question) });
    } catch (thrown) {
      if (!(thrown instanceof PlatesError)) throw thrown;
      hear({ refusal: thrown.message });
    }
  };
  if (typeof Worker === 'undefined') {
    void workHere();
    return () => {
      isGone = true;
    };
  }
  const worker = new Worker(new URL('./plates.worker.ts', import.meta.url), { type: 'module' });
  worker.onmessage = ({ data }: MessageEvent<PlatesMessage>) => {
    hear(data);
    if (!('done' in data)) worker.terminate();
  };
  worker.onerror = () => {
    worker.terminate();
    void workHere();
  };
  worker.postMessage(question);
  return () => {
    isGone = true;
    worker.terminate();
  };
}
