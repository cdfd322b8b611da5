import type { WorkshopKit } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { kitTexts as texts } from '../../config/texts/workshop-kits.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';

const LicenceDialog = lazy(async () => ({ default: (await import('./licence-dialog.js')).LicenceDialog }));

type OfferedLicence = WorkshopKit['licences'][number];

const columns: Column<OfferedLicence>[] = [
  { key: 'name', header: texts.licenceColumns.name, isHeading: true, cell: (one) => one.name },
  { key: 'price', header: texts.licenceColumns.price, isNumeric: true, cell: (one) => price(one.price) },
  {
    key: 'limit',
    header: texts.licenceColumns.limit,
    isNumeric: true,
    cell: (one) => (one.yearlyLimit === null ? texts.unlimited : number(one.yearlyLimit)),
  },
  {
    key: 'offered',
    header: texts.licenceColumns.offered,
    cell: (one) => (one.isOffered ? texts.offered : texts.notOffered),
  },
];

/** What a kit is sold under, and for how much. */
export function KitLicences({ kit }: { kit: WorkshopKit }) {
  const { may, session } = useSession();
  const [edited, setEdited] = useState<OfferedLicence | null>();
  const editColumn: Column<OfferedLicence> = {
    key: 'edit',
    header: texts.licenceColumns.edit,
    cell: (one) => (
      <Button
        look="plain"
        size="sm"
        minHeight="1.5rem"
        paddingBlock="0"
        aria-label={texts.editLicenceOf(one.name)}
        onClick={() => setEdited(one)}
      >
        {texts.editLicence}
      </Button>
    ),
  };
  const mayPrice = may('prices:write');
  return (
    <>
      <Heading level={2} look="section" marginBottom="1">
        {texts.licences}
      </Heading>
      {kit.licences.length === 0 ? (
        <Text isSoft>{texts.noLicence}</Text>
      ) : (
        <HairlineTable
          caption={texts.licencesCaption}
          columns={mayPrice ? [...columns, editColumn] : columns}
          rows={kit.licences}
          rowKey={(one) => one.id}
        />
      )}
      {mayPrice && (
        <Button look="outline" size="sm" marginTop="4" onClick={() => setEdited(null)}>
          {texts.addLicence}
        </Button>
      )}
      {edited !== undefined && session && (
        <Suspense>
          <LicenceDialog
            kitId={kit.id}
            currency={session.workshop.currency}
            licence={edited}
            onClose={() => setEdited(undefined)}
          />
        </Suspense>
      )}
    </>
  );
}
