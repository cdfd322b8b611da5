import { Box } from '@chakra-ui/react/box';
import type { ReprintList, ShelfKit } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { PartsSheet } from '../../ui/drawing/parts-sheet.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { ChangedPartsAction } from './changed-parts-action.js';
import { ReprintBasis } from './reprint-basis.js';
import { ReprintTable } from './reprint-table.js';
import type { Download } from './use-download.js';

/** Every part of the wanted revision; what is to print is filled. */
export const drawnReprints = (list: ReprintList) =>
  list.parts.flatMap(({ drawing, code, name, print, quantity }) =>
    drawing && quantity > 0
      ? { ...drawing, code, name, isToReprint: list.from.basis !== 'nothing' && print > 0 }
      : [],
  );

/** What to print for the newest revision, or for another one that is chosen. */
export function ReprintSection({ kit, download }: { kit: ShelfKit; download: Download }) {
  const [chosen, setChosen] = useState<string>();
  const wanted = kit.revisions.find(({ id }) => id === chosen) ?? kit.newest;
  const isNewest = wanted.id === kit.newest.id;
  const { data, fault, mutate } = useEndpoint(
    'GET /shelf/:slug/reprint',
    isNewest ? null : { params: { slug: kit.slug }, query: { revision: wanted.id } },
    { keepPreviousData: true },
  );
  const list = isNewest ? kit.reprint : (data?.list ?? kit.reprint);
  const choices = kit.revisions.filter(({ id, isWithdrawn }) => !isWithdrawn || id === kit.held?.id);
  const drawn = drawnReprints(list);
  const hasList = list.from.basis !== 'nothing' && list.parts.some(({ advice }) => advice !== null);
  return (
    <Box display="grid" gap="6" marginTop="8" gridTemplateColumns="minmax(0, 1fr)">
      {drawn.length > 0 && <PartsSheet parts={drawn} label={shelfKitTexts.sheet(kit.name)} />}
      {choices.length > 1 && (
        <Box maxWidth="20rem">
          <SelectField
            label={texts.upTo}
            options={choices.map(({ id, label, isWithdrawn }) => ({
              value: id,
              label: texts.option(label, id === kit.newest.id, isWithdrawn),
            }))}
            value={wanted.id}
            onChange={(event) => setChosen(event.currentTarget.value)}
          />
        </Box>
      )}
      {fault ? (
        <Fault what={texts.failed} fault={fault} level={2} onAgain={() => void mutate()} />
      ) : (
        <ReprintBasis list={list} />
      )}
      {hasList && <ReprintTable parts={list.parts} />}
      {hasList && !wanted.isWithdrawn && (
        <ChangedPartsAction key={wanted.id} slug={kit.slug} revisionId={wanted.id} download={download} />
      )}
      {list.parts.some(({ print, optional }) => print + optional > 0) && (
        <TextLink to={paths.shelfReprint.to({ slug: kit.slug }, isNewest ? {} : { revision: wanted.id })}>
          {texts.toPage}
        </TextLink>
      )}
    </Box>
  );
}
