import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import type { ApiFault } from './api-fault.js';

/** Puts the API's sentences beside their fields. True where at least one found its field. */
export function showFieldFaults<T extends FieldValues>(
  fault: ApiFault,
  fields: readonly Path<T>[],
  setError: UseFormSetError<T>,
): boolean {
  const known = fields.filter((name) => fault.fields[name] !== undefined);
  known.forEach((name, at) =>
    setError(name, { type: 'server', message: fault.fields[name] }, { shouldFocus: at === 0 }),
  );
  return known.length > 0;
}
