import { Box } from '@chakra-ui/react/box';
import type { Pledge } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { ownPledgeTexts as texts, pledgeStateTexts } from '../../config/texts/pledge.js';
import { date, price } from '../../lib/format.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';
import { pledgeSigns } from './pledge-words.js';
import type { OwnPledge } from './use-own-pledge.js';

const day = (moment: string | null) => <Unbroken>{moment ? date(moment) : texts.none4}</Unbroken>;
const columns: readonly Column<Pledge>[] = [
  { key: 'plan', header: texts.earlierColumns.plan, isHeading: true, cell: (one) => one.plan.name },
  { key: 'began', header: texts.earlierColumns.began, cell: (one) => day(one.beganAt) },
  { key: 'ended', header: texts.earlierColumns.ended, cell: (one) => day(one.endedAt) },
  {
    key: 'state',
    header: texts.earlierColumns.state,
    cell: (one) => <StatusMark state={pledgeSigns[one.state]}>{pledgeStateTexts[one.state]}</StatusMark>,
  },
  {
    key: 'amount',
    header: texts.earlierColumns.amount,
    isNumeric: true,
    cell: (one) => <Unbroken>{price(one.amount)}</Unbroken>,
  },
];

/** Pledges that are over, below the one shown. */
export function EarlierPledges({ own, current }: { own: OwnPledge; current: Pledge }) {
  const { answer } = own;
  if (!answer || answer.total < 2) return null;
  return (
    <Box as="section" marginTop="12">
      <Heading level={2} marginBottom="4">
        {texts.earlier}
      </Heading>
      <HairlineTable
        caption={texts.earlier}
        columns={columns}
        rows={answer.items.filter(({ id }) => id !== current.id)}
        rowKey={(one) => one.id}
      />
      <Pager
        page={answer.page}
        size={answer.size}
        total={answer.total}
        addressOf={(change) => paths.pledge.to({}, change)}
      />
    </Box>
  );
}
