import { useCallback, useRef, useState } from 'react';
import { tunerTexts } from '../../../config/texts/tuner.js';
import { bytes } from '../../../lib/format.js';
import { decodeRecording, mostRecordingBytes } from './decode-recording.js';
import type { Recording } from './read-recording.js';

export type RecordingState =
  | { is: 'none' }
  | { is: 'reading'; fileName: string }
  | { is: 'refused'; sentence: string }
  | { is: 'here'; fileName: string; recording: Recording };

/** A sound file chosen on this machine; it is decoded here and goes nowhere. */
export function useRecording(): [RecordingState, choose: (file: File) => void, forget: () => void] {
  const [state, setState] = useState<RecordingState>({ is: 'none' });
  const wish = useRef(0);
  const choose = useCallback(async (file: File) => {
    wish.current += 1;
    const mine = wish.current;
    const fileName = file.name;
    if (file.size > mostRecordingBytes) {
      const sentence = tunerTexts.tooLarge(fileName, bytes(mostRecordingBytes));
      return setState({ is: 'refused', sentence });
    }
    setState({ is: 'reading', fileName });
    const recording = await decodeRecording(file).catch(() => undefined);
    if (mine !== wish.current) return;
    setState(
      recording
        ? { is: 'here', fileName, recording }
        : { is: 'refused', sentence: tunerTexts.unreadable(fileName) },
    );
  }, []);
  const forget = useCallback(() => {
    wish.current += 1;
    setState({ is: 'none' });
  }, []);
  return [state, (file) => void choose(file), forget];
}
