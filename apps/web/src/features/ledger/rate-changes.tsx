import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { useState } from 'react';
import { ledgerTexts } from '../../config/texts/workshop-ledger.js';
import { ratesTexts as texts } from '../../config/texts/workshop-tax.js';
import { dateTime } from '../../lib/format.js';
import { countryName, day } from '../../lib/workshop-format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { tableTexts } from '../../config/texts/furniture.js';
import { Fault } from '../../ui/fault.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';

type Change = OutputOf<'GET /workshop/ledger/rates/changes'>['items'][number];

const rate = (value: string | null) => (value === null ? ledgerTexts.none : texts.percent(value));
const columns: Column<Change>[] = [
  {
    key: 'country',
    header: texts.changeColumns.country,
    isHeading: true,
    cell: (one) => countryName(one.country),
  },
  {
    key: 'validFrom',
    header: texts.changeColumns.validFrom,
    cell: (one) => <Unbroken>{day(one.validFrom)}</Unbroken>,
  },
  { key: 'before', header: texts.changeColumns.before, isNumeric: true, cell: (one) => rate(one.before) },
  { key: 'after', header: texts.changeColumns.after, isNumeric: true, cell: (one) => rate(one.after) },
  { key: 'source', header: texts.changeColumns.source, cell: (one) => one.source || ledgerTexts.none },
  { key: 'who', header: texts.changeColumns.who, cell: (one) => one.who },
  { key: 'at', header: texts.changeColumns.at, cell: (one) => <Unbroken>{dateTime(one.at)}</Unbroken> },
];
const size = 10;

/** Who changed which rate; the newest ten, and more when asked for. */
export function RateChanges() {
  const [page, setPage] = useState(1);
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/ledger/rates/changes',
    { query: { page, size } },
    { keepPreviousData: true },
  );
  const pages = Math.ceil((data?.total ?? 0) / size);
  return (
    <Box as="section" marginTop="12">
      <Heading level={2} look="subsection" marginBottom="2">
        {texts.changes}
      </Heading>
      {fault && <Fault fault={fault} onAgain={() => void mutate()} level={3} />}
      {data?.total === 0 && <Text isSoft>{texts.noChanges}</Text>}
      {data && data.total > 0 && (
        <HairlineTable
          caption={texts.changesCaption}
          columns={columns}
          rows={data.items}
          rowKey={(one) => one.id}
        />
      )}
      {pages > 1 && (
        <Box display="flex" gap="3" marginTop="3" alignItems="center" fontSize="sm">
          <Button
            look="outline"
            size="sm"
            aria-disabled={page === 1}
            onClick={() => setPage(Math.max(1, page - 1))}
          >
            {tableTexts.previous}
          </Button>
          {tableTexts.pageOf(page, pages)}
          <Button
            look="outline"
            size="sm"
            aria-disabled={page === pages}
            onClick={() => setPage(Math.min(pages, page + 1))}
          >
            {tableTexts.next}
          </Button>
        </Box>
      )}
    </Box>
  );
}
