import { Controller, Req, Res } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { collectDefaultMetrics, Gauge, Registry } from 'prom-client';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import { Endpoint } from './endpoint.js';
import { Refusal } from './refusal.js';

@Controller()
export class HealthController {
  private readonly registry = new Registry();

  constructor(@InjectConnection() private readonly database: Sequelize) {
    collectDefaultMetrics({ register: this.registry });
    const jobs = new Gauge({
      name: 'windchest_jobs',
      help: 'Jobs of the outbox by state',
      labelNames: ['state'],
      registers: [this.registry],
      collect: async () => {
        const rows = await selectRows<{ state: string; count: number }>(
          database,
          'SELECT state, COUNT(*) AS count FROM jobs GROUP BY state',
        );
        jobs.reset();
        for (const row of rows) jobs.set({ state: row.state }, Number(row.count));
      },
    });
  }

  @Endpoint('GET /health/live')
  live(): Answer<'GET /health/live'> {
    return { status: 'live' };
  }

  @Endpoint('GET /health/ready')
  async ready(): Promise<Answer<'GET /health/ready'>> {
    try {
      await selectRows(this.database, 'SELECT name FROM schema_migrations LIMIT 1');
    } catch {
      throw new Refusal('busy-try-again', 'The database does not answer.');
    }
    return { status: 'ready' };
  }

  @Endpoint('GET /metrics')
  async metrics(@Req() request: Request, @Res() response: Response): Promise<void> {
    if (!['127.0.0.1', '::1', '::ffff:127.0.0.1'].includes(request.ip ?? ''))
      throw new Refusal('not-found', 'There is nothing at this address.');
    response.type('text/plain; version=0.0.4').send(await this.registry.metrics());
  }
}
