import { Box } from '@chakra-ui/react/box';
import { Navigate, useParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { fitTexts as texts } from '../../config/texts/fit.js';
import { useEndedSession, useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { usePrinters } from '../bench/use-printers.js';
import { OwnReports } from './own-reports.js';
import { ReportForm } from './report-form.js';

/** Says how a part of a kit on the shelf fits, and shows what became of it. */
export function ReportFitPage() {
  const { slug = '' } = useParams();
  const state = useSignInState();
  // The form begins with the printer's nozzle and filament.
  const { isLoading } = usePrinters();
  const {
    data: kit,
    fault,
    mutate,
  } = useEndpoint('GET /shelf/:slug', state === 'signed-in' ? { params: { slug } } : null);
  useEndedSession(fault);
  if (state === 'signed-out') return <Navigate to={signInThenBack(paths.shelfFit.to({ slug }))} replace />;
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Text isSoft>
        <TextLink to={paths.shelfKit.to({ slug })}>{texts.back}</TextLink>
      </Text>
      {fault && !kit ? (
        <Fault level={1} what={texts.notThere} fault={fault} onAgain={() => void mutate()} />
      ) : !kit ? (
        <SkeletonLines lines={6} />
      ) : (
        <KitColour palette={kit.colour}>
          <Heading level={1}>{texts.title}</Heading>
          <Text look="lead" marginTop="2" marginBottom="7">
            {texts.lead(kit.name, (kit.held ?? kit.newest).label)}
          </Text>
          <Box
            display="grid"
            gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 3fr) minmax(0, 2fr)' }}
            columnGap="16"
            rowGap="12"
            alignItems="start"
          >
            {isLoading ? <SkeletonLines lines={6} /> : <ReportForm kit={kit} />}
            <Box as="section">
              <OwnReports slug={slug} />
            </Box>
          </Box>
        </KitColour>
      )}
    </Band>
  );
}
