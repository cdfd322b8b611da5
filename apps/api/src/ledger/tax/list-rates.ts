import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, CountryRates, Handled, ProductKind } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows } from '../../database/rows.js';
import { rateText } from '../rate-text.js';

interface RateRow {
  country: string;
  kind: ProductKind;
  validFrom: string;
  rate: string | number;
  source: string;
}

const regions = new Intl.DisplayNames('en', { type: 'region' });
const YEAR_DAYS = 365;

/** Rates as the workshop looks at them: by country, with what held before, what comes, and what is missing. */
@Injectable()
export class ListRates {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
  ) {}

  async page({
    page,
    size,
    search = '',
  }: Handled<'GET /workshop/ledger/rates'>['query']): Promise<Answer<'GET /workshop/ledger/rates'>> {
    const [rows, receipts] = await Promise.all([this.rates(), this.receiptsByCountry()]);
    const wanted = search.toLowerCase();
    const all = grouped(rows, this.today(), receipts).filter(
      ({ country }) =>
        country.toLowerCase() === wanted || (regions.of(country) ?? '').toLowerCase().includes(wanted),
    );
    // As many rows as there are countries with a tax: few enough to be sorted by name here.
    all.sort((a, b) => (regions.of(a.country) ?? '').localeCompare(regions.of(b.country) ?? '', 'en'));
    return { items: all.slice((page - 1) * size, page * size), page, size, total: all.length };
  }

  /** Where consumers bought for money without a rate that held, most receipts first. */
  async missing(): Promise<Answer<'GET /workshop/ledger/rates/missing'>> {
    const rows = await selectRows<{ country: string; receipts: number | string; lastSoldAt: Date }>(
      this.database,
      `SELECT r.country, COUNT(*) AS receipts, MAX(r.issued_at) AS lastSoldAt FROM receipts r
       WHERE r.issued_at >= :since AND r.total_minor > 0 AND r.tax_treatment = 'consumer'
         AND NOT EXISTS (SELECT 1 FROM tax_rates t WHERE t.country = r.country AND t.valid_from <= :today)
       GROUP BY r.country ORDER BY receipts DESC, r.country`,
      { since: this.yearAgo(), today: this.today() },
    );
    return rows.map(({ country, receipts, lastSoldAt }) => ({
      country,
      receipts: Number(receipts),
      lastSoldAt: lastSoldAt.toISOString(),
    }));
  }

  private rates(): Promise<RateRow[]> {
    return selectRows<RateRow>(
      this.database,
      `SELECT country, product_kind AS kind, DATE_FORMAT(valid_from, '%Y-%m-%d') AS validFrom,
              rate_percent AS rate, source
       FROM tax_rates ORDER BY country, product_kind, valid_from DESC`,
    );
  }

  private async receiptsByCountry(): Promise<Map<string, number>> {
    const rows = await selectRows<{ country: string; receipts: number | string }>(
      this.database,
      `SELECT country, COUNT(*) AS receipts FROM receipts WHERE issued_at >= :since AND total_minor > 0 GROUP BY country`,
      { since: this.yearAgo() },
    );
    return new Map(rows.map((row) => [row.country, Number(row.receipts)]));
  }

  private today(): string {
    return this.clock.now().toISOString().slice(0, 10);
  }

  private yearAgo(): Date {
    return this.clock.in(-YEAR_DAYS * 86_400);
  }
}

const grouped = (
  rows: readonly RateRow[],
  today: string,
  receipts: ReadonlyMap<string, number>,
): CountryRates[] => {
  const byCountry = new Map<string, CountryRates>();
  for (const { country, kind, rate, validFrom, source } of rows) {
    const key = `${country} ${kind}`;
    const entry = byCountry.get(key) ?? {
      country,
      kind,
      current: null,
      next: null,
      steps: [],
      receipts: receipts.get(country) ?? 0,
    };
    const step = { ratePercent: rateText(rate), validFrom, source };
    entry.steps.push(step);
    // Newest first: the first that has begun holds, the last that has not comes next.
    if (validFrom > today) entry.next = step;
    else entry.current ??= step;
    byCountry.set(key, entry);
  }
  return [...byCountry.values()];
};
