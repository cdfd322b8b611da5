import type { PrinterCardBody } from '@windchest/contracts';
import type { ApiFault } from '../../lib/api-fault.js';
import { keepPrinterCard } from '../../lib/printer-card.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { browserKey } from './use-printers.js';

const stale = ['GET /account/printers'] as const;

export interface KeepPrinter {
  /** Keeps a new card, or the changed one of this key. @returns its key, or null where it was refused */
  keep: (body: PrinterCardBody, key: string | null) => Promise<string | null>;
  fault: ApiFault | undefined;
  isRunning: boolean;
}

/** Where a card goes: on the account of whoever is signed in; a visitor's stays in the browser. */
export function useKeepPrinter(): KeepPrinter {
  const { isSignedIn } = useSession();
  const adding = useAction('POST /account/printers', stale);
  const changing = useAction('PUT /account/printers/:printerId', stale);

  const keep = async ({ isMain, ...fields }: PrinterCardBody, key: string | null) => {
    if (key === browserKey || (key === null && !isSignedIn)) {
      keepPrinterCard(fields);
      return browserKey;
    }
    const body = { ...fields, isMain };
    const outcome =
      key === null ? await adding.run({ body }) : await changing.run({ params: { printerId: key }, body });
    return outcome.isDone ? outcome.data.id : null;
  };
  return {
    keep,
    fault: adding.fault ?? changing.fault,
    isRunning: adding.isRunning || changing.isRunning,
  };
}
