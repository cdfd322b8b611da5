import { Box } from '@chakra-ui/react/box';
import type { Person } from '@windchest/contracts';
import { useState } from 'react';
import { accountTexts } from '../../config/texts/account.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { AccountSection } from './account-section.js';

export function AddressSection({ person }: { person: Person }) {
  const [isSent, setIsSent] = useState(false);
  const { run, fault, isRunning } = useAction('POST /account/verification');
  const send = async () => {
    setIsSent(false);
    setIsSent((await run()).isDone);
  };
  return (
    <AccountSection title={accountTexts.email}>
      <Box display="flex" flexWrap="wrap" alignItems="baseline" columnGap="4">
        <Text overflowWrap="anywhere">{person.email}</Text>
        <StatusMark state={person.isVerified ? 'ok' : 'warn'}>
          {person.isVerified ? accountTexts.verified : accountTexts.notVerified}
        </StatusMark>
      </Box>
      {!person.isVerified && (
        <Box display="grid" gap="4" justifyItems="start" marginTop="2">
          <Text isSoft>{accountTexts.notVerifiedDetail}</Text>
          {isSent && (
            <Notice isNews tone="ok">
              {accountTexts.sentAgain}
            </Notice>
          )}
          {fault && <Fault what={accountTexts.sendAgainFailed} fault={fault} />}
          <Button look="outline" onClick={send} isBusy={isRunning}>
            {accountTexts.sendAgain}
          </Button>
        </Box>
      )}
    </AccountSection>
  );
}
