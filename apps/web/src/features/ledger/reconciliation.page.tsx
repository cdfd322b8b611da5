import { Box } from '@chakra-ui/react/box';
import type { Reconciliation } from '@windchest/contracts';
import { useParams } from 'react-router-dom';
import { ledgerTexts, reconciliationTexts as texts } from '../../config/texts/workshop-ledger.js';
import { number, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Progress } from '../../ui/progress.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';
import { isUnderWay } from './exports.page.js';
import { LedgerHead } from './ledger-head.js';
import { ReconciliationRows } from './reconciliation-rows.js';
import { spanWords } from './reconciliations.page.js';

type Sum = NonNullable<Reconciliation['sums']>[number];

const amountColumn = (key: 'here' | 'there' | 'fees'): Column<Sum> => ({
  key,
  header: texts.sumColumns[key],
  isNumeric: true,
  cell: (sum) => {
    const amount = sum[key];
    return <Unbroken>{amount ? price(amount) : ledgerTexts.none}</Unbroken>;
  },
});
const sumColumns: Column<Sum>[] = [
  { key: 'kind', header: texts.sumColumns.kind, isHeading: true, cell: (sum) => texts.kinds[sum.kind] },
  { key: 'count', header: texts.sumColumns.count, isNumeric: true, cell: (sum) => number(sum.count) },
  amountColumn('here'),
  amountColumn('there'),
  amountColumn('fees'),
];

const Result = ({ one, sums }: { one: Reconciliation; sums: readonly Sum[] }) => (
  <Box display="grid" gap="9" gridTemplateColumns="minmax(0, 1fr)">
    {one.differences === 0 ? (
      <Notice tone="ok" title={texts.allAgrees}>
        {texts.allAgreesDetail}
      </Notice>
    ) : (
      <Notice tone="warn" title={texts.differ(one.differences ?? 0)} />
    )}
    {sums.length > 0 && (
      <Box as="section">
        <Heading level={2} look="subsection" marginBottom="2">
          {texts.sums}
        </Heading>
        <HairlineTable
          caption={texts.sumsCaption}
          columns={sumColumns}
          rows={sums}
          rowKey={(sum) => `${sum.kind} ${sum.currency}`}
        />
      </Box>
    )}
    <Box as="section">
      <Heading level={2} look="subsection" marginBottom="3">
        {texts.movements}
      </Heading>
      <ReconciliationRows reconciliationId={one.id} />
    </Box>
  </Box>
);

/** One comparison: how far it is, then what it found. */
export function ReconciliationPage() {
  const { reconciliationId = '' } = useParams();
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/reconciliations/:reconciliationId',
    { params: { reconciliationId } },
    { refreshInterval: (answer) => (answer && !isUnderWay(answer) && answer.state !== 'failed' ? 0 : 1500) },
  );
  const title = data ? texts.heading(spanWords(data)) : texts.title;
  return (
    <Band>
      <PageTitle title={title} />
      <LedgerHead title={title} />
      {!data &&
        (fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={5} />
        ))}
      {data && isUnderWay(data) && (
        <Box maxWidth="measure">
          <Progress
            label={texts.states[data.state]}
            {...(data.state === 'running' ? { done: data.percent / 100 } : {})}
          />
        </Box>
      )}
      {data?.state === 'failed' && <Notice tone="stop">{texts.faultOf(data.fault ?? '')}</Notice>}
      {data?.sums && <Result one={data} sums={data.sums} />}
    </Band>
  );
}
