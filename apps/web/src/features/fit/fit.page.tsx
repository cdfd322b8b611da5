import { Box } from '@chakra-ui/react/box';
import type { FitState, OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { verdictTexts } from '../../config/texts/fit.js';
import { fitListTexts as texts, fitStates } from '../../config/texts/workshop-fit.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, signed } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading, Text } from '../../ui/text.js';
import { FitMatrix } from './fit-matrix.js';
import { fitSigns } from './fit-signs.js';

type Row = OutputOf<'GET /workshop/fit-reports'>['items'][number];

const columns: Column<Row>[] = [
  {
    key: 'part',
    header: texts.columns.part,
    isHeading: true,
    cell: ({ id, partCode, partName }) => (
      <TextLink to={paths.workshop.fitReport.to({ reportId: id })} fontWeight="semibold">
        {partCode} {partName}
      </TextLink>
    ),
  },
  { key: 'kit', header: texts.columns.kit, cell: ({ kit, revision }) => `${kit.name} ${revision}` },
  {
    key: 'fit',
    header: texts.columns.fit,
    cell: ({ verdict, gapMm }) =>
      gapMm === null ? verdictTexts[verdict] : `${verdictTexts[verdict]}, ${signed(gapMm, 2)} mm`,
  },
  {
    key: 'printed',
    header: texts.columns.printed,
    cell: ({ material, nozzleMm, layerMm }) => `${material}, ${nozzleMm} / ${layerMm} mm`,
  },
  { key: 'reporter', header: texts.columns.reporter, cell: ({ reporter }) => reporter.name },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ state }) => (
      <StatusMark state={fitSigns[state]} fontWeight="normal">
        {fitStates[state]}
      </StatusMark>
    ),
  },
  { key: 'at', header: texts.columns.at, cell: ({ createdAt }) => date(createdAt) },
];

const isFitState = (text: string | undefined): text is FitState => text !== undefined && text in fitStates;

/** The matrix of one kit, kept in the address. */
function KitMatrix({ kitId, revisionId }: { kitId: string; revisionId: string | undefined }) {
  const { data, fault, mutate } = useEndpoint('GET /workshop/kits/:kitId/fit-matrix', {
    params: { kitId },
    query: { revisionId },
  });
  if (fault && !data) return <Fault level={3} fault={fault} onAgain={() => void mutate()} />;
  if (data?.rows.length === 0)
    return (
      <EmptyState title={texts.matrixEmpty} level={3}>
        {texts.matrixEmptyDetail}
      </EmptyState>
    );
  return (
    data && (
      <>
        <FitMatrix matrix={data} />
        <Text look="small" isSoft marginTop="3" maxWidth="measure">
          {texts.method}
        </Text>
      </>
    )
  );
}

/** How parts fit: the pattern first, then each report. */
export function WorkshopFitPage() {
  const table = useTableState();
  const { page, size, search } = table.state;
  const kits = useEndpoint('GET /workshop/kits', { query: { size: 100 } });
  const kitId = table.filters['kit'] ?? kits.data?.items[0]?.id;
  const kit = useEndpoint('GET /workshop/kits/:kitId', kitId ? { params: { kitId } } : null);
  const revisionId = table.filters['revision'];
  const state = isFitState(table.filters['state']) ? table.filters['state'] : undefined;
  const narrowing = { kitId: table.filters['kit'], state, search: search || undefined };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/fit-reports',
    { query: { ...narrowing, page, size } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2" marginBottom="6">
        {texts.lead}
      </Text>
      <Box display="flex" flexWrap="wrap" gap="4" marginBottom="6">
        <Box flex="0 1 16rem" minWidth="0">
          <SelectField
            label={texts.kit}
            value={kitId ?? ''}
            onChange={(event) => table.change({ kit: event.target.value, revision: undefined })}
            options={(kits.data?.items ?? []).map(({ id, name }) => ({ value: id, label: name }))}
          />
        </Box>
        <Box flex="0 1 12rem" minWidth="0">
          <SelectField
            label={texts.revision}
            emptyLabel={texts.allRevisions}
            value={revisionId ?? ''}
            onChange={(event) => table.change({ revision: event.target.value || undefined })}
            options={(kit.data?.revisions ?? [])
              .filter((one) => one.releasedAt !== null)
              .map(({ id, label }) => ({ value: id, label }))}
          />
        </Box>
      </Box>
      <Box as="section" marginBottom="12">
        <Heading level={2} marginBottom="4">
          {texts.matrix}
        </Heading>
        {kitId && <KitMatrix kitId={kitId} revisionId={revisionId} />}
      </Box>
      <Heading level={2} marginBottom="4">
        {texts.reports}
      </Heading>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={3} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={({ id }) => id}
          table={table}
          searchLabel={texts.search}
          filters={
            <Box flex="0 1 13rem">
              <SelectField
                label={texts.state}
                emptyLabel={texts.allStates}
                value={state ?? ''}
                onChange={(event) => table.change({ state: event.target.value || undefined })}
                options={Object.entries(fitStates).map(([value, label]) => ({ value, label }))}
              />
            </Box>
          }
          csvHref={apiAddress('GET /workshop/fit-reports.csv', { query: narrowing })}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
