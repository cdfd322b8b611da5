import { Box } from '@chakra-ui/react/box';
import type { Letter } from '@windchest/contracts';
import { useState } from 'react';
import { sendTexts as texts } from '../../config/texts/workshop-letters.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { TextField } from '../../ui/field/text-field.js';
import { Text } from '../../ui/text.js';
import { letterAnswers } from './stale-answers.js';

export interface SendLetterProps {
  letter: Letter;
  /** How many get it, as far as is known. */
  size: number | undefined;
  isDirty: boolean;
}

/** Asks, tells what will happen, and sends now or at a time. */
export function SendLetter({ letter, size, isDirty }: SendLetterProps) {
  const [isAsking, setIsAsking] = useState(false);
  const [isLater, setIsLater] = useState(false);
  const [at, setAt] = useState('');
  const [isTimeMissing, setIsTimeMissing] = useState(false);
  const { run, fault } = useAction('POST /workshop/letters/:letterId/sending', letterAnswers);
  const send = async (): Promise<boolean> => {
    const time = isLater ? new Date(at) : null;
    if (time && !(time.getTime() > Date.now())) {
      setIsTimeMissing(true);
      return false;
    }
    setIsTimeMissing(false);
    return (await run({ params: { letterId: letter.id }, body: { sendAt: time?.toISOString() ?? null } }))
      .isDone;
  };
  return (
    <>
      <Button type="button" disabled={isDirty} onClick={() => setIsAsking(true)}>
        {texts.send}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.ask(letter.subject)}
        confirmLabel={isLater ? texts.schedule : texts.sendNow}
        look="ink"
        onConfirm={send}
      >
        <Box display="grid" gap="4">
          {size !== undefined && <Text>{texts.what(size)}</Text>}
          <RadioRows legend={texts.when}>
            <RadioRow name="when" label={texts.now} checked={!isLater} onChange={() => setIsLater(false)} />
            <RadioRow name="when" label={texts.later} checked={isLater} onChange={() => setIsLater(true)} />
          </RadioRows>
          {isLater && (
            <TextField
              label={texts.at}
              type="datetime-local"
              value={at}
              error={isTimeMissing ? texts.needsTime : undefined}
              onChange={(event) => setAt(event.target.value)}
            />
          )}
          {fault && <Fault what={texts.failed} fault={fault} />}
        </Box>
      </ConfirmDialog>
    </>
  );
}
