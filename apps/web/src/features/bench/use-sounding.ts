import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { useCallback, useEffect, useRef } from 'react';
import type { Pressing } from '../../ui/drawing/use-pressing.js';
import type { SoundingVoice } from './sound-voice.js';

const usualRoom: Room = { temperatureC: 20 };

/** One for the page: browsers allow few, and each new one clicks. */
let context: AudioContext | undefined;

/** Made while the press is being handled, since browsers let a page sound only then. */
function wakeContext(): AudioContext | undefined {
  if (typeof AudioContext === 'undefined') return undefined;
  context ??= new AudioContext();
  if (context.state !== 'running') void context.resume().catch(() => undefined);
  return context;
}

/** Pressing a voice of a rank sounds it. What makes the sound is fetched at the first press. */
export function useSounding(rank: readonly RankVoice[], room: Room = usualRoom): Required<Pressing> {
  const sounding = useRef<SoundingVoice>(undefined);
  const held = useRef<string>(undefined);
  const now = useRef({ rank, room });
  useEffect(() => {
    now.current = { rank, room };
  });
  useEffect(() => () => sounding.current?.stop(), []);

  const onPress = useCallback(async (code: string) => {
    held.current = code;
    const awake = wakeContext();
    const voice = now.current.rank.find((one) => one.code === code)?.voice;
    if (!awake || !voice) return;
    // Without a connection the rank stays silent; nothing else is wrong with the page.
    const loaded = await import('./sound-voice.js').catch(() => undefined);
    if (!loaded) return;
    sounding.current?.stop();
    sounding.current = loaded.soundVoice(awake, voice, now.current.room);
    if (held.current !== code) sounding.current.stop();
  }, []);
  const onRelease = useCallback((code: string) => {
    if (held.current !== code) return;
    held.current = undefined;
    sounding.current?.stop();
  }, []);
  return { onPress: (code) => void onPress(code), onRelease };
}
