import { PlatesError } from '@windchest/plates';
import { type PlatesAnswer, type PlatesQuestion, workOutPlates } from './plates-work.js';

/** `refusal` is a sentence about what was asked: a margin that leaves no room. */
export type PlatesMessage = { done: number } | { answer: PlatesAnswer } | { refusal: string };

const say = (message: PlatesMessage) => self.postMessage(message);
/** Nobody sees smaller steps, and each costs a message. */
const leastStep = 0.02;

self.onmessage = ({ data }: MessageEvent<PlatesQuestion>) => {
  let told = 0;
  try {
    const answer = workOutPlates(data, (done) => {
      if (done - told < leastStep) return;
      told = done;
      say({ done });
    });
    say({ answer });
  } catch (thrown) {
    if (!(thrown instanceof PlatesError)) throw thrown;
    say({ refusal: thrown.message });
  }
};
