import { Box } from '@chakra-ui/react/box';
import { Global } from '@emotion/react';
import type { ReprintPlan, ShelfKit } from '@windchest/contracts';
import { useState } from 'react';
import { Navigate, useParams, useSearchParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { date, number } from '../../lib/format.js';
import { useEndedSession, useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { PartsSheet } from '../../ui/drawing/parts-sheet.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { TitleBlock } from '../../ui/title-block.js';
import { useLightWhenPrinted } from './light-when-printed.js';
import { ReprintBasis } from './reprint-basis.js';
import { piecesOf } from './reprint-list.js';
import { ReprintPlates } from './reprint-plates.js';
import { drawnReprints } from './reprint-section.js';
import { ReprintTable } from './reprint-table.js';

const onPaper = {
  '@page': { size: 'A4', margin: '14mm' },
  '@media print': {
    'body header, body footer, body nav, .not-on-paper, .on-paper button': { display: 'none !important' },
    'html, body': { background: 'white !important' },
    'tr, li, svg': { breakInside: 'avoid' },
    'h2, h3': { breakAfter: 'avoid' },
    '*': { printColorAdjust: 'exact' },
  },
} as const;

function Sheet({ kit, plan }: { kit: ShelfKit; plan: ReprintPlan }) {
  useLightWhenPrinted();
  const [hasOptional, setHasOptional] = useState(true);
  const [writtenAt] = useState(() => new Date().toISOString());
  const { list } = plan;
  const { print, optional } = piecesOf(list.parts);
  const drawn = drawnReprints(list);
  return (
    <KitColour palette={kit.colour}>
      <Global styles={onPaper} />
      <Band>
        <Box className="on-paper" display="grid" gap="6" gridTemplateColumns="minmax(0, 1fr)">
          <Box display="flex" flexWrap="wrap" justifyContent="space-between" alignItems="end" gap="4">
            <Box>
              <Box className="not-on-paper" marginBottom="2">
                <TextLink to={paths.shelfKit.to({ slug: kit.slug })}>{texts.back(kit.name)}</TextLink>
              </Box>
              <Heading level={1}>
                {kit.name}: {texts.titleFor(list.to.label)}
              </Heading>
            </Box>
            <Box className="not-on-paper">
              <Button onClick={() => window.print()}>{texts.printOut}</Button>
            </Box>
          </Box>
          <TitleBlock
            isFramed
            columns={3}
            fields={[
              {
                name: texts.blockFrom,
                value: list.from.labels.length > 0 ? list.from.labels.join(', ') : texts.blockNothing,
              },
              { name: texts.blockTo, value: list.to.label },
              { name: texts.date, value: date(writtenAt) },
              { name: texts.blockPieces, value: number(print) },
              { name: texts.blockOptional, value: number(optional) },
            ]}
          />
          <ReprintBasis list={list} />
          {drawn.length > 0 && <PartsSheet parts={drawn} label={texts.sheet(kit.name)} />}
          <ReprintTable parts={list.parts} hasTicks />
          {print + optional > 0 && (
            <Box as="section" aria-labelledby="plates">
              <Heading level={2} id="plates" marginBottom="4">
                {texts.plates}
              </Heading>
              {optional > 0 && (
                <Box className="not-on-paper" marginBottom="4">
                  <Checkbox
                    label={texts.withOptional}
                    checked={hasOptional}
                    onChange={(event) => setHasOptional(event.currentTarget.checked)}
                  />
                </Box>
              )}
              <ReprintPlates plan={plan} hasOptional={hasOptional} />
            </Box>
          )}
        </Box>
      </Band>
    </KitColour>
  );
}

/** What to print for another revision, to work from at the printer: on the screen, or on paper. */
export function ReprintPage() {
  const { slug = '' } = useParams();
  const [search] = useSearchParams();
  const revision = search.get('revision') ?? undefined;
  const state = useSignInState();
  const kit = useEndpoint('GET /shelf/:slug', state === 'signed-in' ? { params: { slug } } : null);
  const plan = useEndpoint(
    'GET /shelf/:slug/reprint',
    state === 'signed-in' ? { params: { slug }, query: revision ? { revision } : {} } : null,
  );
  const fault = kit.fault ?? plan.fault;
  useEndedSession(fault);
  if (state === 'signed-out')
    return <Navigate to={signInThenBack(paths.shelfReprint.to({ slug }, { revision }))} replace />;
  return (
    <>
      <PageTitle title={kit.data ? `${kit.data.name}: ${texts.title}` : texts.title} />
      {kit.data && plan.data ? (
        <Sheet kit={kit.data} plan={plan.data} />
      ) : (
        <Band>
          {fault ? (
            <>
              <Heading level={1} marginBottom="6">
                {fault.code === 'not-found' ? shelfKitTexts.notYours : texts.failed}
              </Heading>
              <Fault level={2} fault={fault} onAgain={() => void plan.mutate()} />
            </>
          ) : (
            <SkeletonLines lines={5} />
          )}
        </Band>
      )}
    </>
  );
}
