/** The digits behind the point, by ISO 4217 as the runtime knows it. */
function exponentOf(currency: string): number {
  return (
    new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ?? 2
  );
}

/** `1250`, `eur` -> `€12.50`. */
export function formatAmount(minor: number, currency: string): string {
  const format = new Intl.NumberFormat('en', { style: 'currency', currency });
  return format.format(minor / 10 ** exponentOf(currency));
}

/** `12.50`, `eur` -> `1250`; a comma will do too. Null where it is no amount. */
export function parseAmount(typed: string, currency: string): number | null {
  const text = typed.trim().replace(',', '.');
  const digits = exponentOf(currency);
  if (!/^\d{1,9}(\.\d+)?$/.test(text) || (text.split('.')[1]?.length ?? 0) > digits) return null;
  return Math.round(Number(text) * 10 ** digits);
}

/** `1250`, `eur` -> `12.50`, as it is put into a field. */
export function plainAmount(minor: number, currency: string): string {
  const digits = exponentOf(currency);
  return (minor / 10 ** digits).toFixed(digits);
}

// The smallest amounts the service charges, in minor units, from its public page on currencies; written
// from memory of that page. A currency that is not listed has no lower bound here.
const smallestCharge: Record<string, number> = {
  eur: 50, usd: 50, gbp: 30, chf: 50, dkk: 250, nok: 300, sek: 300, pln: 200, czk: 1500, cad: 50, aud: 50, nzd: 50, jpy: 50,
}; // prettier-ignore

export function smallestChargeMinor(currency: string): number {
  return smallestCharge[currency] ?? 1;
}
