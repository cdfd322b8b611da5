import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { useCallback, useEffect, useMemo, useState } from 'react';
import { foresee, type Foreseen, judge, type Judging, targetOf, type Verdict } from './judge.js';
import type { Listening } from './listening.js';
import type { Reading } from './steady-pitch.js';
import { useListening } from './use-listening.js';
import { type Microphone, useMicrophone } from './use-microphone.js';
import { type RecordingState, useRecording } from './use-recording.js';

export interface Tuned {
  reading: Reading;
  verdict: Verdict;
  judging: Judging;
}

export interface Tuner {
  judging: Judging;
  targetHz: number;
  foreseen: Foreseen | undefined;
  listening: Listening;
  /** Of the voice chosen, since it was chosen. */
  tuned: Tuned | undefined;
  /** Every voice heard well, by its code. */
  soFar: ReadonlyMap<string, Tuned>;
  microphone: Microphone;
  recording: RecordingState;
  chooseVoice: (code: string) => void;
  chooseTemperature: (temperatureC: number) => void;
  tuneForRoom: (isForRoom: boolean) => void;
  chooseRecording: (file: File) => void;
}

/** The tuner's state: which voice, in which room, what is heard of it and what that means. */
export function useTuner(rank: readonly [RankVoice, ...RankVoice[]], voicedFor: Room): Tuner {
  const [code, setCode] = useState(rank[0].code);
  const [temperatureC, chooseTemperature] = useState(Math.round(voicedFor.temperatureC));
  const [isForRoom, tuneForRoom] = useState(false);
  const [soFar, setSoFar] = useState<ReadonlyMap<string, Tuned>>(new Map());
  const microphone = useMicrophone();
  const [recording, chooseRecording, forgetRecording] = useRecording();

  const judging = useMemo<Judging>(
    () => ({
      rank,
      voice: rank.find((one) => one.code === code) ?? rank[0],
      room: { ...voicedFor, temperatureC },
      tunedAtC: isForRoom ? undefined : voicedFor.temperatureC,
    }),
    [rank, code, voicedFor, temperatureC, isForRoom],
  );
  const targetHz = targetOf(judging);
  const foreseen = useMemo(() => foresee(judging), [judging]);
  const source = {
    microphone: microphone.state.is === 'on' ? microphone.state.microphone : undefined,
    recording: recording.is === 'here' ? recording.recording : undefined,
  };
  const listening = useListening(source, judging.voice, targetHz);
  const { reading } = listening;
  const tuned = useMemo(
    () => reading && { reading, verdict: judge(reading, judging), judging },
    [reading, judging],
  );

  useEffect(() => {
    if (!tuned?.reading.isSteady || tuned.verdict.says !== 'advice' || tuned.verdict.nearer) return;
    setSoFar((before) => new Map(before).set(tuned.judging.voice.code, tuned));
  }, [tuned]);

  return {
    judging,
    targetHz,
    foreseen,
    listening,
    tuned,
    soFar,
    microphone: {
      ...microphone,
      start: () => {
        forgetRecording();
        microphone.start();
      },
    },
    recording,
    chooseVoice: setCode,
    chooseTemperature,
    tuneForRoom,
    chooseRecording: useCallback(
      (file: File) => {
        microphone.stop();
        chooseRecording(file);
      },
      [microphone, chooseRecording],
    ),
  };
}
