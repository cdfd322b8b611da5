import type { Clearance, OutputOf } from '@windchest/contracts';
import { useState } from 'react';
import { useSWRConfig } from 'swr';
import type { ApiFault } from '../../lib/api-fault.js';
import { isAnswerOf, type Outcome, useAction } from '../../lib/use-action.js';

/** A revision's bundle, its bundle of one clearance, or one document of it. */
export interface Wish {
  kitSlug: string;
  revisionId: string;
  file?: string;
  clearance?: Clearance;
}
type Grant = OutputOf<'POST /shelf/grants'>;

export interface Download {
  start: (wish: Wish) => Promise<void>;
  /** Whether the address of this very file is on its way. */
  isStarting: (wish: Wish) => boolean;
  fault: ApiFault | undefined;
}

const nameOf = (wish: Wish) => [wish.kitSlug, wish.revisionId, wish.file, wish.clearance].join();

function useGrants(ask: (wish: Wish) => Promise<Outcome<Grant>>, fault: ApiFault | undefined): Download {
  const [starting, setStarting] = useState<string>();
  return {
    fault,
    isStarting: (wish) => starting === nameOf(wish),
    start: async (wish) => {
      setStarting(nameOf(wish));
      const outcome = await ask(wish);
      setStarting(undefined);
      // The address works in this browser only, and the answer is an attachment: the page stays.
      if (outcome.isDone) location.assign(outcome.data.url);
    },
  };
}

export function useShelfDownload(): Download {
  const { run, fault } = useAction('POST /shelf/grants', ['GET /shelf', 'GET /shelf/:slug']);
  return useGrants((body) => run({ body }), fault);
}

/** By a mailed link: each counts as one use of it. */
export function useLinkDownload(token: string): Download {
  const { run, fault } = useAction('POST /collect/:token/grants', ['GET /collect/:token']);
  const { mutate } = useSWRConfig();
  return useGrants(async (body) => {
    const outcome = await run({ params: { token }, body });
    // Used up or replaced meanwhile, elsewhere: the page then says so.
    if (!outcome.isDone) await mutate(isAnswerOf(['GET /collect/:token']));
    return outcome;
  }, fault);
}
