import { Box } from '@chakra-ui/react/box';
import type { FitReport } from '@windchest/contracts';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { clearanceTexts, fitStateTexts, fitTexts as texts, verdictTexts } from '../../config/texts/fit.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, signed } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading, Text } from '../../ui/text.js';
import { fitSigns } from './fit-signs.js';

const factsOf = ({ clearance, gapMm, material, nozzleMm, layerMm, printerName }: FitReport): string =>
  [
    clearance && clearanceTexts[clearance],
    gapMm !== null && texts.off(`${signed(gapMm, 2)} mm`),
    material,
    `${nozzleMm} mm`,
    `${layerMm} mm`,
    printerName,
  ]
    .filter(Boolean)
    .join(' · ');

const Entry = ({ report }: { report: FitReport }) => (
  <Box as="article" borderTopWidth="1px" borderColor="hairline" paddingBlock="4">
    <Box display="flex" flexWrap="wrap" justifyContent="space-between" columnGap="4">
      <Heading level={3} look="body">
        {report.partCode} {report.partName}: {verdictTexts[report.verdict]}
      </Heading>
      <StatusMark state={report.state === 'new' ? 'wait' : fitSigns[report.state]} fontWeight="normal">
        {fitStateTexts[report.state]}
      </StatusMark>
    </Box>
    <Text look="small" isSoft>
      {date(report.createdAt)}, {texts.about(report.revision)} · {factsOf(report)}
    </Text>
    {report.words && <Text marginTop="2">{report.words}</Text>}
    {report.hasPicture && (
      <Box marginTop="3" maxWidth="18rem">
        <img
          src={apiAddress('GET /fit-reports/:reportId/picture', { params: { reportId: report.id } })}
          alt={texts.pictureOf(report.partCode)}
          loading="lazy"
        />
      </Box>
    )}
    {report.answers.map(({ at, by, text }) => (
      <Box key={at} marginTop="3" paddingLeft="4" borderLeftWidth="2px" borderColor="hairline">
        <Text look="small" isSoft>
          {texts.answeredBy(by)} {date(at)}
        </Text>
        <Text whiteSpace="pre-line">{text}</Text>
      </Box>
    ))}
    {report.fixedIn && (
      <Text marginTop="3" fontWeight="semibold">
        {texts.mendedIn(report.fixedIn.label, report.fixedIn.isReleased)}
      </Text>
    )}
  </Box>
);

/** What one has reported about a kit, with the workshop's answers. */
export function OwnReports({ slug }: { slug: string }) {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /shelf/:slug/fit-reports',
    { params: { slug }, query: { page, size: 10 } },
    { keepPreviousData: true },
  );
  return (
    <>
      <Heading level={2} marginBottom="4">
        {texts.mine}
      </Heading>
      {fault && !data ? (
        <Fault level={3} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={3} />
      ) : data.items.length === 0 ? (
        <Text isSoft>{texts.mineEmpty}</Text>
      ) : (
        <>
          {data.items.map((report) => (
            <Entry key={report.id} report={report} />
          ))}
          <Pager
            page={data.page}
            size={data.size}
            total={data.total}
            addressOf={(change) => paths.shelfFit.to({ slug }, change)}
          />
        </>
      )}
    </>
  );
}
