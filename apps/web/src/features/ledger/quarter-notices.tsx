import { Box } from '@chakra-ui/react/box';
import type { QuarterSummary } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { quarterTexts as texts } from '../../config/texts/workshop-tax.js';
import { date } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';

const lists = new Intl.ListFormat('en-GB', { type: 'conjunction' });

/** How a quarter stands, and what has to be looked at before anybody files it. */
export const QuarterNotices = ({ summary }: { summary: QuarterSummary }) => {
  const { closedAt, closedBy, isAsClosed, isOver, unclear, missingRates, settled } = summary;
  return (
    <Box display="grid" gap="3" marginBottom="7">
      {!isAsClosed && (
        <Notice tone="stop" title={texts.changed}>
          {texts.changedDetail}
        </Notice>
      )}
      {closedAt && <Notice tone="ok">{texts.closedBy(date(closedAt), closedBy ?? '')}</Notice>}
      {!isOver && <Notice>{texts.running}</Notice>}
      {unclear > 0 && (
        <Notice tone="warn">
          {texts.unclear(unclear)} <TextLink to={paths.workshop.locations.to()}>{texts.toLocations}</TextLink>
        </Notice>
      )}
      {missingRates.length > 0 && (
        <Notice tone="warn">
          {texts.missing(lists.format(missingRates.map(countryName)))}{' '}
          <TextLink to={paths.workshop.rates.to()}>{texts.toRates}</TextLink>
        </Notice>
      )}
      {settled > 0 && <Notice>{texts.settled(settled)}</Notice>}
    </Box>
  );
};
