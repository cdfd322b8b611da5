import { Box } from '@chakra-ui/react/box';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { Button } from '../../../ui/button.js';
import { Notice } from '../../../ui/notice.js';
import type { Microphone } from './use-microphone.js';

/** Starts and stops the microphone, and says what to do where there is none. */
export const ListenButton = ({ microphone: { state, start, stop } }: { microphone: Microphone }) => (
  <Box display="grid" gap="3" justifyItems="start">
    {state.is === 'on' ? (
      <Button look="outline" minWidth="12rem" onClick={stop}>
        {texts.stop}
      </Button>
    ) : (
      <Button minWidth="12rem" onClick={start} isBusy={state.is === 'asking'} busyWords={texts.asking}>
        {texts.listen}
      </Button>
    )}
    {state.is === 'refused' && (
      <Notice tone="warn" title={texts.microphone[state.fault].title} isNews>
        {texts.microphone[state.fault].detail}
      </Notice>
    )}
  </Box>
);
