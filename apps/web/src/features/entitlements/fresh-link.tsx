import { Box } from '@chakra-ui/react/box';
import { useState } from 'react';
import { collectTexts } from '../../config/texts/shelf.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';

export interface FreshLinkProps {
  token: string;
  /** Whether it is the page's next step. */
  isMain?: boolean;
}

/** Mails a fresh link to the order's own address, which is not told here. */
export function FreshLink({ token, isMain }: FreshLinkProps) {
  const [isSent, setIsSent] = useState(false);
  const { run, fault, isRunning } = useAction('POST /collect/:token/replacement', ['GET /collect/:token']);
  const send = async () => setIsSent((await run({ params: { token } })).isDone);
  return (
    <Box display="grid" gap="4" justifyItems="start">
      <Box role="status" justifySelf="stretch">
        {isSent && (
          <Notice tone="ok" title={collectTexts.freshSentTitle}>
            {collectTexts.freshSent}
          </Notice>
        )}
      </Box>
      {fault && <Fault what={collectTexts.freshFailed} fault={fault} />}
      {!isSent && (
        <Button
          look={isMain ? 'ink' : 'outline'}
          onClick={send}
          isBusy={isRunning}
          busyWords={collectTexts.sending}
        >
          {collectTexts.fresh}
        </Button>
      )}
    </Box>
  );
}
