import { useEffect, useState } from 'react';
import type { ApiFault } from '../../../lib/api-fault.js';
import { unreachable } from '../../../lib/api-fault.js';
import { loadPreview } from './load-preview.js';

type Drawing = typeof import('./part-model.js');
export interface LoadedPreview {
  PartModel: Drawing['PartModel'];
  model: Awaited<ReturnType<Drawing['readModel']>>;
}
type Loading =
  | { state: 'loading' }
  | { state: 'failed'; fault: ApiFault }
  | { state: 'unreadable' }
  | ({ state: 'here' } & LoadedPreview);

async function load(address: string): Promise<Loading> {
  const bytes = loadPreview(address);
  const drawing = import('./part-model.js').catch(() => {
    throw unreachable();
  });
  try {
    const [glb, { PartModel, readModel }] = await Promise.all([bytes, drawing]);
    const model = await readModel(glb).catch(() => undefined);
    return model ? { state: 'here', PartModel, model } : { state: 'unreadable' };
  } catch (fault) {
    return { state: 'failed', fault: fault as ApiFault };
  }
}

const isLoading: Loading = { state: 'loading' };

/** A part's likeness and the program that draws it, fetched together, once they are wanted. */
export function usePreview(address: string, isWanted: boolean): [Loading, again: () => void] {
  const [tries, setTries] = useState(0);
  const asked = `${address} ${tries}`;
  const [answer, setAnswer] = useState({ asked, loading: isLoading });
  useEffect(() => {
    if (!isWanted) return;
    let isGone = false;
    void load(address).then((loading) => !isGone && setAnswer({ asked, loading }));
    return () => {
      isGone = true;
    };
  }, [address, asked, isWanted]);
  return [answer.asked === asked ? answer.loading : isLoading, () => setTries((before) => before + 1)];
}
