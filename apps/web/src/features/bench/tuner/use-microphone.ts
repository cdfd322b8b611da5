import { useCallback, useEffect, useRef, useState } from 'react';
import {
  type MicrophoneFault,
  NoMicrophone,
  openMicrophone,
  type OpenMicrophone,
} from './open-microphone.js';

export type MicrophoneState =
  | { is: 'off' }
  | { is: 'asking' }
  | { is: 'refused'; fault: MicrophoneFault }
  | { is: 'on'; microphone: OpenMicrophone };

export interface Microphone {
  state: MicrophoneState;
  start: () => void;
  stop: () => void;
}

/** The microphone while it is wanted; closed with the page. */
export function useMicrophone(): Microphone {
  const [state, setState] = useState<MicrophoneState>({ is: 'off' });
  const open = useRef<OpenMicrophone>(undefined);
  /** Counts presses, so that an answer to an earlier one is not taken for the last one's. */
  const wish = useRef(0);

  const close = useCallback(() => {
    wish.current += 1;
    open.current?.close();
    open.current = undefined;
  }, []);
  useEffect(() => close, [close]);

  const start = useCallback(async () => {
    close();
    const mine = wish.current;
    setState({ is: 'asking' });
    const lost = () => {
      if (mine !== wish.current) return;
      close();
      setState({ is: 'refused', fault: 'lost' });
    };
    try {
      const microphone = await openMicrophone(lost);
      if (mine !== wish.current) return microphone.close();
      open.current = microphone;
      setState({ is: 'on', microphone });
    } catch (thrown) {
      if (mine !== wish.current) return;
      setState({ is: 'refused', fault: thrown instanceof NoMicrophone ? thrown.fault : 'failed' });
    }
  }, [close]);
  const stop = useCallback(() => {
    close();
    setState({ is: 'off' });
  }, [close]);
  return { state, start: () => void start(), stop };
}
