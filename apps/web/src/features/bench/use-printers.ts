import type { PrinterCardFields } from '@windchest/contracts';
import type { ApiFault } from '../../lib/api-fault.js';
import { usePrinterCard } from '../../lib/printer-card.js';
import { useSession } from '../../lib/session.js';
import { storedValue, useStoredValue } from '../../lib/stored-value.js';
import { useEndpoint } from '../../lib/use-endpoint.js';

/** The printer that was typed in without an account. */
export const browserKey = 'browser';

export interface ChoosablePrinter extends PrinterCardFields {
  /** The card's id on the account, or `browserKey`. */
  key: string;
  /** On the account: the one mostly printed on. */
  isMain?: boolean;
}

const chosenKey = storedValue<string | null>({
  key: 'windchest.printer-chosen',
  read: (text) => text,
  write: (key) => key,
});

export interface Printers {
  /** Those of the account, the main one first, then the one kept in the browser. */
  printers: readonly ChoosablePrinter[];
  /** As chosen last on any kit, else the first. */
  chosen: ChoosablePrinter | undefined;
  choose: (key: string) => void;
  isSignedIn: boolean;
  /** Nobody knows yet whether the account has printers. */
  isLoading: boolean;
  fault: ApiFault | undefined;
}

/** The printers to plan prints for. */
export function usePrinters(): Printers {
  const { isSignedIn, isLoading: isSessionLoading } = useSession();
  const kept = useEndpoint('GET /account/printers', isSignedIn ? {} : null);
  const typedIn = usePrinterCard();
  const wanted = useStoredValue(chosenKey);
  const printers: ChoosablePrinter[] = [
    ...(kept.data ?? []).map((card) => ({ ...card, key: card.id })),
    ...(typedIn ? [{ ...typedIn, key: browserKey }] : []),
  ];
  return {
    printers,
    chosen: printers.find((one) => one.key === wanted) ?? printers[0],
    choose: chosenKey.set,
    isSignedIn,
    isLoading: isSessionLoading || kept.isLoading,
    fault: kept.fault,
  };
}
