import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, PledgeState } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';

const MONTHS = 12;

/** How many supporters there are, and what they bring in, month by month. */
@Injectable()
export class SupporterFigures {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly clock: Clock,
  ) {}

  async read(): Promise<Answer<'GET /workshop/supporter-figures'>> {
    const states = await selectRows<{ state: PledgeState; pledges: number | string; minor: number | string }>(
      this.database,
      `SELECT state, COUNT(*) AS pledges, SUM(amount_minor) AS minor FROM pledges
       WHERE state IN ('current', 'grace', 'paused') GROUP BY state`,
    );
    const of = (state: PledgeState) => states.find((row) => row.state === state);
    return {
      current: Number(of('current')?.pledges ?? 0),
      grace: Number(of('grace')?.pledges ?? 0),
      paused: Number(of('paused')?.pledges ?? 0),
      monthly: this.money(of('current')?.minor ?? 0),
      months: await this.months(),
    };
  }

  private async months(): Promise<Answer<'GET /workshop/supporter-figures'>['months']> {
    const now = this.clock.now();
    const starts = Array.from(
      { length: MONTHS },
      (_, index) => new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() - MONTHS + 1 + index, 1)),
    );
    const rows = await selectRows<{ month: string; payments: number | string; minor: number | string }>(
      this.database,
      `SELECT DATE_FORMAT(paid_at, '%Y-%m') AS month, COUNT(*) AS payments, SUM(amount_minor) AS minor
       FROM pledge_payments WHERE paid_at >= :from AND currency = :currency GROUP BY month`,
      { from: starts[0], currency: this.config.WORKSHOP_CURRENCY },
    );
    const found = new Map(rows.map((row) => [row.month, row]));
    return starts.map((start) => {
      const month = start.toISOString().slice(0, 7);
      const row = found.get(month);
      return { month, payments: Number(row?.payments ?? 0), gross: this.money(row?.minor ?? 0) };
    });
  }

  private money(minor: number | string): { minor: number; currency: string } {
    return { minor: Number(minor), currency: this.config.WORKSHOP_CURRENCY };
  }
}
