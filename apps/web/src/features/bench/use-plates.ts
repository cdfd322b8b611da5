import { useEffect, useState } from 'react';
import { askForPlates } from './ask-for-plates.js';
import type { PlatesAnswer, PlatesQuestion } from './plates-work.js';

export interface WorkedPlates {
  /** The last one worked out; while another is on its way it is that of the question before. */
  answer: PlatesAnswer | undefined;
  /** How far the work is, 0..1; undefined when it is done. */
  done: number | undefined;
  /** Why there is no answer to this question. */
  refusal: string | undefined;
}

/** Plates for a question, which is made anew (memoized) whenever it asks something else. */
export function usePlates(question: PlatesQuestion): WorkedPlates {
  const [state, setState] = useState<WorkedPlates>({
    answer: undefined,
    done: 0,
    refusal: undefined,
  });
  useEffect(() => {
    setState((before) => ({ ...before, done: 0 }));
    return askForPlates(question, {
      onProgress: (done) => setState((before) => ({ ...before, done })),
      onAnswer: (answer) => setState({ answer, done: undefined, refusal: undefined }),
      onRefusal: (refusal) => setState({ answer: undefined, done: undefined, refusal }),
    });
  }, [question]);
  return state;
}
