import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Cron, CronExpression } from '@nestjs/schedule';
import { Op } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { OneTimeToken } from './one-time-token.model.js';
import { SessionRecord } from './session.model.js';

/** Clears out what has expired: sessions, and mailed tokens a month after their end. */
@Injectable()
export class SweepSessions {
  constructor(
    @InjectModel(SessionRecord) private readonly sessions: typeof SessionRecord,
    @InjectModel(OneTimeToken) private readonly tokens: typeof OneTimeToken,
    private readonly clock: Clock,
  ) {}

  @Cron(CronExpression.EVERY_HOUR)
  async sweep(): Promise<void> {
    await this.sessions.destroy({ where: { expires: { [Op.lt]: this.clock.now() } } });
    await this.tokens.destroy({ where: { expiresAt: { [Op.lt]: this.clock.in(-30 * 86_400) } } });
  }
}
