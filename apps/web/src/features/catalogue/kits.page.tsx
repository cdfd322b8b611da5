import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { kitsTexts as texts } from '../../config/texts/workshop-kits.js';
import { date, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';

type KitRow = OutputOf<'GET /workshop/kits'>['items'][number];

const columns: Column<KitRow>[] = [
  {
    key: 'name',
    header: texts.columns.name,
    isHeading: true,
    cell: (kit) => (
      <KitColour palette={kit.colour} display="flex" alignItems="baseline" gap="2.5">
        <Box as="span" width="0.5rem" height="0.9rem" bg="kit" flex="none" alignSelf="center" aria-hidden />
        <TextLink to={paths.workshop.kit.to({ kitId: kit.id })} fontWeight="semibold">
          {kit.name}
        </TextLink>
      </KitColour>
    ),
  },
  { key: 'newest', header: texts.columns.newest, cell: (kit) => kit.newest ?? texts.none },
  { key: 'draft', header: texts.columns.draft, cell: (kit) => kit.draft ?? texts.none },
  {
    key: 'price',
    header: texts.columns.price,
    isNumeric: true,
    cell: (kit) => (kit.price ? price(kit.price) : texts.none),
  },
  {
    key: 'listed',
    header: texts.columns.listed,
    cell: (kit) => (
      <Box as="span" color={kit.isListed ? undefined : 'ink.soft'}>
        {kit.isListed ? texts.listed : texts.hidden}
      </Box>
    ),
  },
  { key: 'updated', header: texts.columns.updated, cell: (kit) => date(kit.updatedAt) },
];

/** All kits, also those nobody else sees yet. */
export function WorkshopKitsPage() {
  const { may } = useSession();
  const table = useTableState();
  const { page, size, search } = table.state;
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/kits',
    { query: { page, size, search: search || undefined } },
    { keepPreviousData: true },
  );
  const draftLink = may('kits:write') && <LinkButton to={paths.workshop.newKit.to()}>{texts.new}</LinkButton>;
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Box
        display="flex"
        flexWrap="wrap"
        alignItems="center"
        justifyContent="space-between"
        gap="4"
        marginBottom="6"
      >
        <Heading level={1}>{texts.title}</Heading>
        {data?.total !== 0 && draftLink}
      </Box>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(kit) => kit.id}
          table={table}
          searchLabel={texts.search}
          empty={
            <EmptyState title={texts.empty} action={draftLink}>
              {texts.emptyDetail}
            </EmptyState>
          }
        />
      )}
    </Band>
  );
}
