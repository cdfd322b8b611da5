import { useEffect, useState } from 'react';
import { askForPlates } from './ask-for-plates.js';
import type { PlatesAnswer, PlatesQuestion } from './plates-work.js';

/** An answer, and what it answers. */
export interface Worked {
  question: PlatesQuestion;
  answer: PlatesAnswer;
}

export interface WorkedPlates {
  /** The last that was worked out: that of the question before while another is on its way, or is refused. */
  last: Worked | undefined;
  /** How far the work is, 0..1; undefined when it is done. */
  done: number | undefined;
  /** Why there is no answer to this question. */
  refusal: string | undefined;
}

interface Heard {
  /** The question that this is about. */
  of?: PlatesQuestion;
  done?: number;
  last?: Worked;
  refusal?: string;
}

/** Plates for a question, which is made anew (memoized) whenever it asks something else. */
export function usePlates(question: PlatesQuestion): WorkedPlates {
  const [heard, setHeard] = useState<Heard>({});
  useEffect(
    () =>
      askForPlates(question, {
        onProgress: (done) => setHeard(({ last }) => ({ of: question, done, last })),
        onAnswer: (answer) => setHeard({ of: question, last: { question, answer } }),
        onRefusal: (refusal) => setHeard(({ last }) => ({ of: question, refusal, last })),
      }),
    [question],
  );
  const isOfThis = heard.of === question;
  return {
    last: heard.last,
    done: isOfThis ? heard.done : 0,
    refusal: isOfThis ? heard.refusal : undefined,
  };
}
