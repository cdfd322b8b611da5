import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows } from '../database/rows.js';

export interface LowCoupon {
  readonly id: string;
  readonly code: string;
  readonly left: number;
}

/** Coupons for other rooms to read. */
@Injectable()
export class CouponsReader {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
  ) {}

  /** Running coupons with a tenth of their places left or less, the fewest first. */
  async nearlyUsedUp(): Promise<LowCoupon[]> {
    const rows = await selectRows<LowCoupon>(
      this.database,
      `SELECT id, code, cap - held - redeemed AS \`left\` FROM coupons
       WHERE is_active AND cap IS NOT NULL AND (ends_at IS NULL OR ends_at > :now)
         AND 10 * (held + redeemed) >= 9 * cap ORDER BY \`left\`, code`,
      { now: this.clock.now() },
    );
    return rows.map((row) => ({ ...row, left: Number(row.left) }));
  }
}
