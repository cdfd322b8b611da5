import { sha256Of } from './sha256-of.js';

export interface HashQuestion {
  id: number;
  file: File;
}
export type HashAnswer = { id: number } & ({ done: number } | { sha256: string } | { isUnreadable: true });

const answer = (message: HashAnswer) => self.postMessage(message);

self.onmessage = async ({ data: { id, file } }: MessageEvent<HashQuestion>) => {
  try {
    answer({ id, sha256: await sha256Of(file, (done) => answer({ id, done })) });
  } catch {
    answer({ id, isUnreadable: true });
  }
};
