import { Box } from '@chakra-ui/react/box';
import { useRef } from 'react';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { Button } from '../../../ui/button.js';
import { Notice } from '../../../ui/notice.js';
import { Text } from '../../../ui/text.js';
import type { RecordingState } from './use-recording.js';

export interface RecordingFieldProps {
  recording: RecordingState;
  onChoose: (file: File) => void;
}

/** A sound file instead of the microphone. */
export function RecordingField({ recording, onChoose }: RecordingFieldProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <Box display="grid" gap="2" justifyItems="start">
      <Button
        look="outline"
        size="sm"
        isBusy={recording.is === 'reading'}
        busyWords={texts.reading}
        onClick={() => input.current?.click()}
      >
        {texts.recording}
      </Button>
      <input
        ref={input}
        type="file"
        hidden
        accept="audio/*,.wav,.mp3,.ogg,.flac"
        onChange={(event) => {
          const file = event.target.files?.[0];
          if (file) onChoose(file);
          // The same file again is news too.
          event.target.value = '';
        }}
      />
      <Text look="small" isSoft overflowWrap="anywhere" role="status">
        {recording.is === 'here' ? texts.read(recording.fileName) : texts.recordingHint}
      </Text>
      {recording.is === 'refused' && (
        <Notice tone="stop" title={texts.unreadableTitle} isNews>
          {recording.sentence}
        </Notice>
      )}
    </Box>
  );
}
