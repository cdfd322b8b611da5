import { Box } from '@chakra-ui/react/box';
import type { Letter } from '@windchest/contracts';
import { useState } from 'react';
import { sendingTexts as texts } from '../../config/texts/workshop-letters.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { letterAnswers } from './stale-answers.js';

/** Pause, go on, break off; before its time, take back. */
export function SteerLetter({ letter }: { letter: Letter }) {
  const { id: letterId, state, counts } = letter;
  const [isAsking, setIsAsking] = useState(false);
  const pause = useAction('POST /workshop/letters/:letterId/pause', letterAnswers);
  const resume = useAction('POST /workshop/letters/:letterId/resume', letterAnswers);
  const cancel = useAction('POST /workshop/letters/:letterId/cancellation', letterAnswers);
  const isWaiting = state === 'scheduled';
  if (!['scheduled', 'sending', 'paused'].includes(state)) return null;
  const fault = pause.fault ?? resume.fault;
  const params = { letterId };
  return (
    <Box display="flex" flexWrap="wrap" alignItems="center" gap="3">
      {state === 'sending' && (
        <Button look="outline" isBusy={pause.isRunning} onClick={() => void pause.run({ params })}>
          {texts.pause}
        </Button>
      )}
      {state === 'paused' && (
        <Button isBusy={resume.isRunning} onClick={() => void resume.run({ params })}>
          {texts.resume}
        </Button>
      )}
      <Button look={isWaiting ? 'outline' : 'stop'} onClick={() => setIsAsking(true)}>
        {isWaiting ? texts.takeBack : texts.cancel}
      </Button>
      {fault && <Fault what={texts.failed} fault={fault} />}
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={isWaiting ? texts.takeBackAsk : texts.cancelAsk}
        confirmLabel={isWaiting ? texts.takeBack : texts.cancel}
        look={isWaiting ? 'ink' : 'stop'}
        onConfirm={async () => (await cancel.run({ params })).isDone}
      >
        <Text>{isWaiting ? texts.takeBackWhat : texts.cancelWhat(counts.queued)}</Text>
        {cancel.fault && <Fault what={texts.failed} fault={cancel.fault} />}
      </ConfirmDialog>
    </Box>
  );
}
