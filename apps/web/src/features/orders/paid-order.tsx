import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { orderTexts } from '../../config/texts/order.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button, LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { Heading, Text } from '../../ui/text.js';

const Mine = ({ isPart }: { isPart: boolean }) => (
  <Box display="grid" gap="4">
    <Heading level={2} look="subsection">
      {orderTexts.next}
    </Heading>
    <Text>{isPart ? orderTexts.keptNext : orderTexts.mineNext}</Text>
    <LinkButton to={paths.shelf.to()}>{orderTexts.toShelf}</LinkButton>
  </Box>
);

function ByMail({ email, isPart }: { email: string; isPart: boolean }) {
  const { isSignedIn } = useSession();
  const [isSent, setIsSent] = useState(false);
  const { run, fault, isRunning } = useAction('POST /collect/lost');
  const send = async () => setIsSent((await run({ body: { email } })).isDone);
  return (
    <Box display="grid" gap="4">
      <Heading level={2} look="subsection">
        {orderTexts.next}
      </Heading>
      <Text fontWeight="semibold">{isPart ? orderTexts.keptByMail : orderTexts.mailNext}</Text>
      <Text isSoft>{orderTexts.freshWhy}</Text>
      {fault && <Fault what={orderTexts.freshFailed} fault={fault} />}
      <Box role="status" overflowWrap="anywhere">
        {isSent && <Notice tone="ok">{orderTexts.freshSent(email)}</Notice>}
      </Box>
      {!isSent && (
        <Button look="outline" onClick={send} isBusy={isRunning} busyWords={orderTexts.sending}>
          {orderTexts.freshLink}
        </Button>
      )}
      {!isSignedIn && (
        <Box display="grid" gap="2" marginTop="4" paddingTop="5" borderTopWidth="1px" borderColor="hairline">
          <Heading level={2} look="subsection">
            {orderTexts.account}
          </Heading>
          <Text isSoft marginBottom="2">
            {orderTexts.accountWhy}
          </Text>
          <LinkButton look="outline" to={paths.join.to()}>
            {orderTexts.join}
          </LinkButton>
        </Box>
      )}
    </Box>
  );
}

/** Where the files are: on the shelf, or behind the link in the mail. */
export function PaidOrder({ order }: { order: BuyerOrder }) {
  const isPart = order.refunded.minor > 0;
  return order.isMine ? <Mine isPart={isPart} /> : <ByMail email={order.email} isPart={isPart} />;
}
