import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { overviewTexts as texts } from '../../config/texts/workshop-overview.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import type { SignName } from '../../ui/sign.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusLine } from '../../ui/status-mark.js';
import { Heading } from '../../ui/text.js';
import { SalesChart } from './sales-chart.js';

type Waiting = OutputOf<'GET /workshop/overview'>['waiting'][number];

const signs: Record<Waiting['kind'], SignName> = {
  draft: 'wait',
  'flagged-order': 'warn',
  'dead-job': 'stop',
  'coupon-low': 'note',
  'refused-file': 'stop',
  'fit-report': 'wait',
  letter: 'wait',
};

const WaitingList = ({ waiting }: { waiting: readonly Waiting[] }) =>
  waiting.length === 0 ? (
    <EmptyState title={texts.nothing}>{texts.nothingDetail}</EmptyState>
  ) : (
    <Box as="section" maxWidth="measure">
      <Heading level={2} look="subsection" marginBottom="2">
        {texts.waiting}
      </Heading>
      <Box as="ul" listStyle="none">
        {waiting.map((one) => (
          <StatusLine key={`${one.kind} ${one.link}`} state={signs[one.kind]}>
            <TextLink to={one.link}>{texts.words[one.kind](one)}</TextLink>
          </StatusLine>
        ))}
      </Box>
    </Box>
  );

/** What waits, and how it sells, for those who see money. */
export function OverviewPage() {
  const { data, fault, mutate } = useEndpoint('GET /workshop/overview');
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1} marginBottom="8">
        {texts.title}
      </Heading>
      {!data ? (
        fault ? (
          <Fault fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={5} />
        )
      ) : (
        <Box
          display="grid"
          columnGap="16"
          rowGap="12"
          alignItems="start"
          gridTemplateColumns={{
            base: 'minmax(0, 1fr)',
            lg: data.sales ? 'minmax(0, 5fr) minmax(0, 7fr)' : 'minmax(0, 1fr)',
          }}
        >
          <WaitingList waiting={data.waiting} />
          {data.sales && <SalesChart sales={data.sales} />}
        </Box>
      )}
    </Band>
  );
}
