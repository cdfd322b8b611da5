import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { useState } from 'react';
import { accountTexts } from '../../config/texts/account.js';
import { dateTime } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { AccountSection } from './account-section.js';
import { deviceWords } from './device-words.js';

type OwnSession = OutputOf<'GET /account/sessions'>[number];

const SessionRow = ({ one }: { one: OwnSession }) => (
  <Box as="li" paddingBlock="2.5" borderBottomWidth="1px" borderColor="hairline">
    <Box display="flex" flexWrap="wrap" columnGap="4" alignItems="baseline" justifyContent="space-between">
      <Box fontWeight="semibold">{deviceWords(one.userAgent)}</Box>
      {one.isThis && <StatusMark state="ok">{accountTexts.thisOne}</StatusMark>}
    </Box>
    <Text look="small" isSoft>
      {accountTexts.startedAt(dateTime(one.startedAt))} · {accountTexts.lastSeen(dateTime(one.lastSeenAt))}
    </Text>
  </Box>
);

export function SessionsSection() {
  const { data: sessions, fault, mutate } = useEndpoint('GET /account/sessions');
  const [isAsking, setIsAsking] = useState(false);
  const ending = useAction('DELETE /account/sessions', ['GET /account/sessions']);
  const others = sessions?.filter((one) => !one.isThis).length ?? 0;

  return (
    <AccountSection title={accountTexts.sessions}>
      {fault && !sessions ? (
        <Fault what={accountTexts.sessionsFailed} fault={fault} onAgain={() => void mutate()} />
      ) : sessions ? (
        <Box maxWidth="measure">
          <Box as="ul" listStyle="none" borderTopWidth="1px" borderColor="hairline" marginBottom="4">
            {sessions.map((one) => (
              <SessionRow key={one.id} one={one} />
            ))}
          </Box>
          {others > 0 ? (
            <Button look="stop" onClick={() => setIsAsking(true)}>
              {accountTexts.endOthers}
            </Button>
          ) : (
            <Text isSoft>{accountTexts.onlyThis}</Text>
          )}
          <ConfirmDialog
            isOpen={isAsking}
            onClose={() => setIsAsking(false)}
            title={accountTexts.endOthersTitle(others)}
            confirmLabel={accountTexts.endOthers}
            onConfirm={async () => (await ending.run()).isDone}
          >
            <Text>{accountTexts.endOthersDetail}</Text>
            {ending.fault && <Fault what={accountTexts.endOthersFailed} fault={ending.fault} />}
          </ConfirmDialog>
        </Box>
      ) : (
        <SkeletonLines lines={3} />
      )}
    </AccountSection>
  );
}
