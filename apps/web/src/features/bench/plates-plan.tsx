import { Box } from '@chakra-ui/react/box';
import type { PrinterCardFields, PrintSheetPart, PrintSpecification } from '@windchest/contracts';
import { usual } from '@windchest/plates';
import { useMemo, useState } from 'react';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { buildVolume, millimetres } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Progress } from '../../ui/progress.js';
import { StatusLine } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { fitWords } from './fit-words.js';
import { LayoutFields } from './layout-fields.js';
import { clearanceEffect, partsInClearance } from './parts-in-clearance.js';
import { PlanSections } from './plan-sections.js';
import { usePlates } from './use-plates.js';

export interface PlatesPlanProps {
  /** What is to print: all parts of a kit, or some of them, with the quantities wanted. */
  parts: readonly PrintSheetPart[];
  /** Codes of parts nobody has measured. */
  unmeasured?: readonly string[];
  /** Of parts without settings of their own. */
  printSpec: PrintSpecification;
  printer: PrinterCardFields;
}

/**
 * What some parts take on a printer: how each lies, the plates to scale, filament, hours, cost. Worked out in this
 * browser. Give it a key of the printer, so that nothing of another printer stays.
 */
export function PlatesPlan({ parts: asDrawn, unmeasured = [], printSpec, printer }: PlatesPlanProps) {
  const { session } = useSession();
  const [layout, setLayout] = useState({ gapMm: usual.gapMm as number, marginMm: usual.marginMm as number });
  const { bed, clearance } = printer;
  const parts = useMemo(() => partsInClearance(asDrawn, clearance), [asDrawn, clearance]);
  const effect = clearanceEffect(asDrawn, clearance);
  const question = useMemo(() => ({ parts, printSpec, bed, ...layout }), [parts, printSpec, bed, layout]);
  const { last, done, refusal } = usePlates(question);
  const names = useMemo(() => new Map(parts.map(({ code, name }) => [code, name])), [parts]);
  const lines = useMemo(
    () =>
      last &&
      fitWords({
        parts: last.answer.parts.map((part) => ({ ...part, name: names.get(part.code) ?? '' })),
        unmeasured,
        volume: buildVolume(last.question.bed),
        marginMm: last.question.marginMm,
      }),
    [last, names, unmeasured],
  );

  const settings = (
    <Box display="grid" gap="4" maxWidth="measure" minHeight={last && { md: '7rem' }}>
      {(last || refusal) && <LayoutFields layout={layout} onChange={setLayout} refusal={refusal} />}
      {done !== undefined && <Progress label={texts.packing} done={done} />}
    </Box>
  );
  return (
    <Box display="grid" gap="6" gridTemplateColumns="minmax(0, 1fr)" width="full">
      {lines && (
        <Box as="ul" listStyle="none" maxWidth="46rem" borderTopWidth="1px" borderColor="hairline">
          {lines.map((line) => (
            <StatusLine key={line.words} state={line.state}>
              {line.words}
            </StatusLine>
          ))}
          {effect && (
            <StatusLine state="note">
              {texts.inClearance(clearanceTexts.named(effect.clearance), effect.gauges.join(', '))}
            </StatusLine>
          )}
          {printer.nozzleMm !== printSpec.nozzleMm && (
            <StatusLine state="note">
              {texts.fitNozzle(millimetres(printSpec.nozzleMm, 2), millimetres(printer.nozzleMm, 2))}
            </StatusLine>
          )}
        </Box>
      )}
      {!last && refusal && <Text role="alert">{texts.refused}</Text>}
      {last && session ? (
        <PlanSections
          answer={last.answer}
          question={last.question}
          unmeasured={unmeasured}
          printer={printer}
          currency={session.workshop.currency}
          settings={settings}
        />
      ) : (
        settings
      )}
    </Box>
  );
}
