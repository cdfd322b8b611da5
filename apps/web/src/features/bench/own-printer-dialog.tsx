import { PrinterCardDialog } from './printer-card-dialog.js';
import { browserKey, usePrinters } from './use-printers.js';

export interface OwnPrinterDialogProps {
  /** Writes another one down, though there is one already. */
  isNew?: boolean;
  onClose: () => void;
  onKept?: (key: string) => void;
}

/** The printer that plans are made for, to change; or the first one, to write down. */
export function OwnPrinterDialog({ isNew, onClose, onKept }: OwnPrinterDialogProps) {
  const { printers, chosen, choose } = usePrinters();
  const card = isNew ? null : (chosen ?? null);
  return (
    <PrinterCardDialog
      card={card}
      hasOthers={printers.some(({ key }) => key !== browserKey && key !== card?.key)}
      onClose={onClose}
      onKept={(key) => {
        choose(key);
        onKept?.(key);
      }}
    />
  );
}
