import { useEffect, useState } from 'react';
import { earFor, frameSizeFor } from './hear-frame.js';
import { type Judging, targetOf } from './judge.js';
import { listen, type Listening, notYetListening } from './listening.js';
import type { OpenMicrophone } from './open-microphone.js';
import { readRecording, type Recording } from './read-recording.js';
import type { Reading } from './steady-pitch.js';

export interface Source {
  microphone: OpenMicrophone | undefined;
  recording: Recording | undefined;
}
/** A steady reading, and what it was taken by. */
export interface Taken {
  reading: Reading;
  judging: Judging;
}
interface Heard {
  /** The voice and the sound it was heard in: what was heard of one says nothing of another. */
  code: string;
  from: OpenMicrophone | Recording | undefined;
  listening: Listening;
  /** The last steady reading of each voice, by its code. */
  taken: ReadonlyMap<string, Taken>;
}

/** So often a frame is looked at; frames overlap by more than half. */
const everyMs = 70;
const rest = () => new Promise<void>((resolve) => setTimeout(resolve));
const nothing: Heard = { code: '', from: undefined, listening: notYetListening, taken: new Map() };

const known = ({ code, from, listening }: Heard, judging: Judging, source: Heard['from']): Listening =>
  code === judging.voice.code && (source === undefined || from === source) ? listening : notYetListening;

/** What was heard, with what is heard now. */
function withHeard(before: Heard, listening: Listening, judging: Judging, from: Heard['from']): Heard {
  const { code } = judging.voice;
  const { reading } = listening;
  const isNew = reading?.isSteady && reading !== before.taken.get(code)?.reading;
  const taken = isNew ? new Map(before.taken).set(code, { reading, judging }) : before.taken;
  return { code, from, listening, taken };
}

/** What is heard of one voice, from the microphone while it is open, else from the recording. */
export function useListening(
  { microphone, recording }: Source,
  judging: Judging,
): Pick<Heard, 'listening' | 'taken'> {
  const [heard, setHeard] = useState(nothing);

  useEffect(() => {
    if (!microphone) return;
    const targetHz = targetOf(judging);
    const size = frameSizeFor(targetHz, microphone.sampleRate);
    const hear = earFor(targetHz, microphone.sampleRate);
    const timer = setInterval(() => {
      const frame = hear(microphone.read(size));
      setHeard((before) => {
        const { kind } = judging.voice.voice;
        const next = listen(known(before, judging, microphone), frame, performance.now(), kind);
        return withHeard(before, next, judging, microphone);
      });
    }, everyMs);
    return () => clearInterval(timer);
  }, [microphone, judging]);

  useEffect(() => {
    if (!recording || microphone) return;
    let isGone = false;
    void readRecording(recording, targetOf(judging), judging.voice.voice.kind, rest).then(
      (read) => !isGone && setHeard((before) => withHeard(before, read, judging, recording)),
    );
    return () => {
      isGone = true;
    };
  }, [recording, microphone, judging]);

  return { listening: known(heard, judging, microphone ?? recording), taken: heard.taken };
}
