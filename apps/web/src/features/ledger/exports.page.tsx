import { Box } from '@chakra-ui/react/box';
import type { YearExport } from '@windchest/contracts';
import { useState } from 'react';
import { exportsTexts as texts, ledgerTexts } from '../../config/texts/workshop-ledger.js';
import { apiAddress } from '../../lib/api-address.js';
import { bytes, dateTime } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextAnchor } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Progress } from '../../ui/progress.js';
import { Band } from '../../ui/sheet.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';
import { LedgerHead } from './ledger-head.js';
import { yearsUntil } from './receipt-years.js';

export const workSigns: Record<YearExport['state'], SignName> = {
  waiting: 'wait',
  running: 'wait',
  done: 'ok',
  failed: 'stop',
};
export const isUnderWay = ({ state }: Pick<YearExport, 'state'>): boolean =>
  state === 'waiting' || state === 'running';

const years = yearsUntil(new Date());

const State = ({ one }: { one: YearExport }) => {
  if (one.state === 'running') return <Progress label={texts.progress(one.year)} done={one.percent / 100} />;
  if (one.state === 'done')
    return (
      <TextAnchor
        href={apiAddress('GET /workshop/ledger/exports/:exportId/file', { params: { exportId: one.id } })}
        download
        aria-label={texts.downloadOf(one.year)}
      >
        {texts.download}
      </TextAnchor>
    );
  return (
    <>
      <StatusMark state={workSigns[one.state]}>{texts.states[one.state]}</StatusMark>
      {one.fault && (
        <Box fontSize="sm" color="ink.soft">
          {texts.faultOf(one.fault)}
        </Box>
      )}
    </>
  );
};

const columns: Column<YearExport>[] = [
  {
    key: 'year',
    header: texts.columns.year,
    isHeading: true,
    cell: (one) => <Unbroken>{one.year}</Unbroken>,
  },
  { key: 'state', header: texts.columns.state, width: '30%', cell: (one) => <State one={one} /> },
  {
    key: 'size',
    header: texts.columns.size,
    cell: (one) => <Unbroken>{one.bytes === null ? ledgerTexts.none : bytes(one.bytes)}</Unbroken>,
  },
  {
    key: 'hash',
    header: texts.columns.hash,
    cell: (one) => (
      <Box as="span" display="block" maxWidth="15rem" fontFamily="mono" fontSize="xs" overflowWrap="anywhere">
        {one.sha256 ?? ledgerTexts.none}
      </Box>
    ),
  },
  { key: 'by', header: texts.columns.by, cell: (one) => one.askedBy },
  {
    key: 'asked',
    header: texts.columns.asked,
    cell: (one) => <Unbroken>{dateTime(one.createdAt)}</Unbroken>,
  },
];

/** Whole years as one file each. */
export function ExportsPage() {
  const table = useTableState();
  const { page, size } = table.state;
  const [year, setYear] = useState(years[0]?.value ?? '');
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/exports',
    { query: { page, size } },
    {
      keepPreviousData: true,
      refreshInterval: (answer) => (answer?.items.some(isUnderWay) ? 1500 : 0),
    },
  );
  const {
    run,
    fault: askFault,
    isRunning,
  } = useAction('POST /workshop/ledger/exports', ['GET /workshop/ledger/exports']);
  return (
    <Band>
      <PageTitle title={texts.title} />
      <LedgerHead title={texts.title} lead={texts.lead} isAboutTax />
      <Box display="flex" flexWrap="wrap" alignItems="flex-end" gap="3" marginBottom="2">
        <Box flex="0 1 9rem">
          <SelectField
            label={texts.year}
            value={year}
            onChange={(event) => setYear(event.target.value)}
            options={years}
          />
        </Box>
        <Button
          isBusy={isRunning}
          busyWords={texts.asking}
          onClick={() => void run({ body: { year: Number(year) } })}
        >
          {texts.ask}
        </Button>
      </Box>
      <Text look="small" isSoft marginBottom="7">
        {texts.private}
      </Text>
      {askFault && <Fault what={texts.failed} fault={askFault} />}
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
