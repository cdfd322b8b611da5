import { storedValue } from './stored-value.js';

/** A visitor's printer as the browser keeps it; every page knows whether there is one, few have to read it. */
export const printerText = storedValue<string | null>({
  key: 'windchest.printer',
  read: (text) => text,
  write: (text) => text,
});
