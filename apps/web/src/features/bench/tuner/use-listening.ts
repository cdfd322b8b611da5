import type { RankVoice } from '@windchest/contracts';
import { useEffect, useState } from 'react';
import { earFor, frameSizeFor } from './hear-frame.js';
import { listen, type Listening, notYetListening } from './listening.js';
import type { OpenMicrophone } from './open-microphone.js';
import { readRecording, type Recording } from './read-recording.js';

export interface Source {
  microphone: OpenMicrophone | undefined;
  recording: Recording | undefined;
}

/** So often a frame is looked at; frames overlap by more than half. */
const everyMs = 70;
const rest = () => new Promise<void>((resolve) => setTimeout(resolve));

/** What is heard of one voice, from the microphone while it is open, else from the recording. */
export function useListening(
  { microphone, recording }: Source,
  { code, voice: { kind } }: RankVoice,
  targetHz: number,
): Listening {
  // With the voice it was heard for: what was heard of one says nothing of the next.
  const [heard, setHeard] = useState({ code, listening: notYetListening });
  useEffect(() => {
    if (microphone) setHeard({ code: '', listening: notYetListening });
  }, [microphone]);

  useEffect(() => {
    if (!microphone) return;
    const { sampleRate } = microphone;
    const size = frameSizeFor(targetHz, sampleRate);
    const hear = earFor(targetHz, sampleRate);
    const timer = setInterval(() => {
      const frame = hear(microphone.read(size));
      setHeard((before) => {
        const known = before.code === code ? before.listening : notYetListening;
        return { code, listening: listen(known, frame, performance.now(), kind) };
      });
    }, everyMs);
    return () => clearInterval(timer);
  }, [microphone, targetHz, code, kind]);

  useEffect(() => {
    if (!recording || microphone) return;
    let isGone = false;
    void readRecording(recording, targetHz, kind, rest).then(
      (listening) => !isGone && setHeard({ code, listening }),
    );
    return () => {
      isGone = true;
    };
  }, [recording, microphone, targetHz, code, kind]);

  return heard.code === code ? heard.listening : notYetListening;
}
