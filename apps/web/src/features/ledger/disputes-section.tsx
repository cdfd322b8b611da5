import { Box } from '@chakra-ui/react/box';
import type { Dispute } from '@windchest/contracts';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { dateTime, price } from '../../lib/format.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';

const signs: Record<Dispute['state'], SignName> = {
  inquiry: 'warn',
  open: 'warn',
  won: 'ok',
  lost: 'stop',
  closed: 'none',
};
const isWaiting = ({ state }: Dispute) => state === 'inquiry' || state === 'open';

/** Each dispute: how it stands, what was said, until when to answer, and its turns. */
export const DisputesSection = ({ disputes }: { disputes: readonly Dispute[] }) => (
  <Box as="ul" listStyle="none">
    {disputes.map((dispute) => (
      <Box
        as="li"
        key={dispute.id}
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '11rem minmax(0, 1fr)' }}
        columnGap="4"
        rowGap="1"
        paddingBlock="3"
        borderBottomWidth="1px"
        borderColor="hairline"
      >
        <Box fontWeight="semibold">{price(dispute.amount)}</Box>
        <Box>
          <StatusMark state={signs[dispute.state]}>{texts.disputeStates[dispute.state]}</StatusMark>
          <Text look="small" isSoft>
            {texts.disputeReason(dispute.reason.replaceAll('_', ' '))}
          </Text>
          {isWaiting(dispute) && dispute.answerBy && (
            <Text look="small">{texts.answerBy(dateTime(dispute.answerBy))}</Text>
          )}
          <Box as="ol" listStyle="none" marginTop="1" fontSize="sm" color="ink.soft">
            {dispute.history.map((turn) => (
              <li key={`${turn.at} ${turn.state}`}>
                {dateTime(turn.at)} {texts.disputeTurns[turn.state]}
                {turn.detail && `: ${turn.detail}`}
              </li>
            ))}
          </Box>
        </Box>
      </Box>
    ))}
  </Box>
);
