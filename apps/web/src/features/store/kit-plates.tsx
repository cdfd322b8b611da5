import { platesTexts } from '../../config/texts/plates.js';
import { buildVolume } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { Progress } from '../../ui/progress.js';
import { PlatesPlan } from '../bench/plates-plan.js';
import type { ChoosablePrinter } from '../bench/use-printers.js';

export interface KitPlatesProps {
  slug: string;
  printer: ChoosablePrinter;
}

/** The newest revision of a kit on one printer. */
export function KitPlates({ slug, printer }: KitPlatesProps) {
  const { data: sheet, fault, mutate } = useEndpoint('GET /kits/:slug/print', { params: { slug } });
  if (!sheet)
    return fault ? (
      <Fault what={platesTexts.loadFailed} fault={fault} level={3} onAgain={() => void mutate()} />
    ) : (
      <Progress label={platesTexts.loading} />
    );
  return (
    <PlatesPlan
      key={`${printer.key} ${buildVolume(printer.bed)}`}
      parts={sheet.parts}
      unmeasured={sheet.unmeasured}
      printSpec={sheet.printSpec}
      printer={printer}
    />
  );
}
