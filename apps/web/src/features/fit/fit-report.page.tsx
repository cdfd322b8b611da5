import { Box } from '@chakra-ui/react/box';
import type { WorkshopFitReport } from '@windchest/contracts';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { clearanceTexts, verdictTexts } from '../../config/texts/fit.js';
import { fitReportTexts as texts, fitStates } from '../../config/texts/workshop-fit.js';
import { apiAddress } from '../../lib/api-address.js';
import { dateTime, signed } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { AnswerForm } from './answer-form.js';
import { MendForm } from './mend-form.js';

const fieldsOf = (report: WorkshopFitReport) => [
  { name: texts.facts.kit, value: `${report.kit.name} ${report.revision}` },
  {
    name: texts.facts.deviation,
    value: report.gapMm === null ? texts.notMeasured : `${signed(report.gapMm, 2)} mm`,
  },
  ...(report.clearance ? [{ name: texts.facts.clearance, value: clearanceTexts[report.clearance] }] : []),
  { name: texts.facts.material, value: report.material },
  { name: texts.facts.nozzle, value: `${report.nozzleMm} mm, ${report.layerMm} mm` },
  ...(report.printerName ? [{ name: texts.facts.printer, value: report.printerName }] : []),
  { name: texts.facts.reporter, value: `${report.reporter.name}, ${report.reporter.email}` },
  { name: texts.facts.sent, value: dateTime(report.createdAt) },
  { name: texts.facts.state, value: fitStates[report.state] },
];

const Answers = ({ report }: { report: WorkshopFitReport }) => (
  <Box as="section" marginTop="8">
    <Heading level={2} look="subsection" marginBottom="3">
      {texts.answers}
    </Heading>
    {report.answers.length === 0 && <Text isSoft>{texts.noAnswers}</Text>}
    {report.answers.map(({ at, by, text }) => (
      <Box key={at} paddingBlock="3" borderTopWidth="1px" borderColor="hairline">
        <Text look="small" isSoft>
          {by}, {dateTime(at)}
        </Text>
        <Text whiteSpace="pre-line">{text}</Text>
      </Box>
    ))}
  </Box>
);

/** One report: what was said, and what the workshop does about it. */
export function FitReportPage() {
  const { reportId = '' } = useParams();
  const {
    data: report,
    fault,
    mutate,
  } = useEndpoint('GET /workshop/fit-reports/:reportId', { params: { reportId } });
  if (!report)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={1} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  const title = texts.title(`${report.partCode} ${report.partName}`, verdictTexts[report.verdict]);
  return (
    <>
      <PageTitle title={title} />
      <SplitSheet
        asideLabel={texts.mend}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.fit.to()}>{texts.back}</TextLink>
            </Text>
            <Heading level={1}>{title}</Heading>
            <Text marginTop="4" maxWidth="measure" whiteSpace="pre-line" isSoft={!report.words}>
              {report.words || texts.noWords}
            </Text>
            {report.hasPicture && (
              <Box marginTop="4" maxWidth="30rem">
                <img
                  src={apiAddress('GET /fit-reports/:reportId/picture', { params: { reportId } })}
                  alt={texts.picture(report.partCode)}
                />
              </Box>
            )}
            <Answers report={report} />
            <AnswerForm reportId={reportId} />
          </>
        }
        aside={<MendForm report={report} />}
        block={<TitleBlock columns={2} fields={fieldsOf(report)} />}
      />
    </>
  );
}
