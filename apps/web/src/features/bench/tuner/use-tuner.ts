import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { useMemo, useState } from 'react';
import { foresee, type Foreseen, judge, type Judging, targetOf, type Verdict } from './judge.js';
import type { Listening } from './listening.js';
import { type Taken, useListening } from './use-listening.js';
import { type Microphone, useMicrophone } from './use-microphone.js';
import { type RecordingState, useRecording } from './use-recording.js';

export interface Tuned extends Taken {
  verdict: Verdict;
}

export interface Tuner {
  judging: Judging;
  targetHz: number;
  foreseen: Foreseen | undefined;
  listening: Listening;
  /** Of the voice chosen. */
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

/** Voices that surely sounded themselves, with what to do about them. */
const heardWell = (taken: ReadonlyMap<string, Taken>): ReadonlyMap<string, Tuned> =>
  new Map(
    [...taken].flatMap(([code, one]) => {
      const verdict = judge(one.reading, one.judging);
      const isIts = verdict.says === 'advice' && !verdict.nearer;
      return isIts ? [[code, { ...one, verdict }] as const] : [];
    }),
  );

/** The tuner's state: which voice, in which room, what is heard of it and what that means. */
export function useTuner(rank: readonly [RankVoice, ...RankVoice[]], voicedFor: Room): Tuner {
  const [code, setCode] = useState(rank[0].code);
  const [temperatureC, chooseTemperature] = useState(Math.round(voicedFor.temperatureC));
  const [isForRoom, tuneForRoom] = useState(false);
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
  const source = {
    microphone: microphone.state.is === 'on' ? microphone.state.microphone : undefined,
    recording: recording.is === 'here' ? recording.recording : undefined,
  };
  const { listening, taken } = useListening(source, judging);
  const { reading } = listening;

  return {
    judging,
    targetHz: targetOf(judging),
    foreseen: useMemo(() => foresee(judging), [judging]),
    listening,
    tuned: useMemo(
      () => reading && { reading, judging, verdict: judge(reading, judging) },
      [reading, judging],
    ),
    soFar: useMemo(() => heardWell(taken), [taken]),
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
    chooseRecording: (file) => {
      microphone.stop();
      chooseRecording(file);
    },
  };
}
