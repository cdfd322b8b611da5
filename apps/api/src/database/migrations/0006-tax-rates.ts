import { inOrder } from './statements.js';

/**
 * Standard rates in percent, with the day from which they are known to hold.
 *
 * Sources: npm sales-tax 2.23.0 (MIT), `res/sales_tax_rates.json`, agreeing with a page "VAT 2025 in the 27
 * EU countries" on all 27, and with two lists of January 2025 but for the changes of that year below. No
 * official table of the Union was read. A country's row of 2025-01-01 says that its rate held on that day,
 * not since when. Changes: FI 24 to 25.5 on 2024-09-01, SK 20 to 23 on 2025-01-01, EE 22 to 24 on
 * 2025-07-01, RO 19 to 21 on 2025-08-01.
 */
const held: Record<string, string> = {
  AT: '20',
  BE: '21',
  BG: '20',
  HR: '25',
  CY: '19',
  CZ: '21',
  DK: '25',
  EE: '22',
  FR: '20',
  DE: '19',
  GR: '24',
  HU: '27',
  IE: '23',
  IT: '22',
  LV: '21',
  LT: '21',
  LU: '17',
  MT: '18',
  NL: '21',
  PL: '23',
  PT: '23',
  RO: '19',
  SK: '23',
  SI: '22',
  ES: '21',
  SE: '25',
};
const rows: (readonly [country: string, rate: string, validFrom: string])[] = [
  ...Object.entries(held).map(([country, rate]) => [country, rate, '2025-01-01'] as const),
  ['FI', '25.5', '2024-09-01'],
  ['EE', '24', '2025-07-01'],
  ['RO', '21', '2025-08-01'],
];
const SOURCE = 'sales-tax 2.23.0 (npm, MIT) and a list of the 27 EU countries of 2025';

/** Tax rates by country and kind of product, each with the day it holds from. */
export const up = inOrder(
  `CREATE TABLE tax_rates (
    country CHAR(2) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    product_kind VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    valid_from DATE NOT NULL,
    rate_percent DECIMAL(6,3) NOT NULL,
    source VARCHAR(200) NOT NULL,
    PRIMARY KEY (country, product_kind, valid_from)
  )`,
  `INSERT INTO tax_rates (country, product_kind, valid_from, rate_percent, source) VALUES ${rows
    .map(([country, rate, from]) => `('${country}', 'electronic-service', '${from}', ${rate}, '${SOURCE}')`)
    .join(', ')}`,
);
