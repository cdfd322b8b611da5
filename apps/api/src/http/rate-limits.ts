import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import type { Sequelize } from 'sequelize';
import { InjectConfig, type Config } from '../config/config.js';
import { Refusal } from './refusal.js';

/** Points within a number of seconds, for one key (an address of the network or an e-mail address). */
const limits = {
  'sign-in': { points: 10, duration: 300 },
  'sign-in-address': { points: 30, duration: 900 },
  join: { points: 20, duration: 3600 },
  'mailed-link': { points: 5, duration: 900 },
  'mailed-link-network': { points: 40, duration: 900 },
  token: { points: 60, duration: 300 },
  coupon: { points: 120, duration: 60 },
  checkout: { points: 60, duration: 60 },
  // Each is typeset anew, which takes some hundredths of a second.
  papers: { points: 60, duration: 60 },
} as const;
export type LimitName = keyof typeof limits;

/** Limits kept in the database, so that all processes share them. */
@Injectable()
export class RateLimits {
  private readonly limiters: Record<LimitName, RateLimiterMySQL>;

  constructor(
    @InjectConnection() database: Sequelize,
    @InjectConfig() private readonly config: Config,
  ) {
    this.limiters = Object.fromEntries(
      Object.entries(limits).map(([name, limit]) => [
        name,
        new RateLimiterMySQL({
          storeClient: database,
          storeType: 'sequelize',
          dbName: config.DB_NAME,
          tableName: 'rate_limits',
          tableCreated: true,
          keyPrefix: name,
          ...limit,
        }),
      ]),
    ) as unknown as Record<LimitName, RateLimiterMySQL>;
  }

  /** @throws Refusal `too-many-requests` that says how long to wait */
  async take(name: LimitName, key: string): Promise<void> {
    if (this.config.RATE_LIMITS_OFF) return;
    try {
      await this.limiters[name].consume(key.slice(0, 190));
    } catch (fault) {
      if (!(fault instanceof RateLimiterRes)) throw fault;
      const seconds = Math.max(1, Math.ceil(fault.msBeforeNext / 1000));
      const wait = seconds < 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
      throw new Refusal('too-many-requests', `That was tried too often. Wait ${wait} and try again.`, {
        retryAfterSeconds: seconds,
      });
    }
  }
}
