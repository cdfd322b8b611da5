import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Type } from '@nestjs/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { getConnectionToken } from '@nestjs/sequelize';
import { Test } from '@nestjs/testing';
import type { Sequelize } from 'sequelize';
import supertest from 'supertest';
import { Clock } from '../adapters/clock/clock.js';
import { Mailer } from '../adapters/mailer/mailer.js';
import { AppModule } from '../app.module.js';
import { furnishApp } from '../create-app.js';
import { JobWorker } from '../jobs/job-worker.js';
import { RecordingMailer } from './recording-mailer.js';
import { createTestDatabase } from './test-database.js';

/** A clock that tests move. */
export class TestClock extends Clock {
  private offsetMs = 0;
  private stoppedAt: Date | null = null;

  override now(): Date {
    return this.stoppedAt ?? new Date(Date.now() + this.offsetMs);
  }

  /** From now on it shows this moment, until it is stopped at another. */
  stopAt(moment: Date): void {
    this.stoppedAt = moment;
  }

  advance(seconds: number): void {
    this.offsetMs += seconds * 1000;
  }
}

type Abstract = abstract new (...args: never[]) => object;

export interface TestApp {
  readonly app: NestExpressApplication;
  readonly database: Sequelize;
  readonly mailer: RecordingMailer;
  readonly clock: TestClock;
  readonly url: string;
  /** Runs all due jobs. */
  drain(): Promise<number>;
  /** A browser of its own: keeps cookies, sends the shop's header. */
  browser(): Browser;
  stop(): Promise<void>;
}

export type Browser = ReturnType<typeof supertest.agent>;

const BASE = 'http://127.0.0.1';

/** The real application on a database of its own; jobs run only when a test drains them. */
export const startTestApp = async (
  environment: Record<string, string> = {},
  /** What stands in for a piece of the outside world, by the class it is asked for by. */
  standIns: (clock: TestClock) => readonly (readonly [token: Type | Abstract, standIn: object])[] = () => [],
): Promise<TestApp> => {
  const testDatabase = await createTestDatabase();
  const folder = await mkdtemp(join(tmpdir(), 'windchest-test-'));
  const before = { ...process.env };
  Object.assign(process.env, {
    NODE_ENV: 'test',
    BASE_URL: BASE,
    SESSION_SECRET: 'session-secret-for-tests-0123456789',
    LINK_SECRET: 'link-secret-for-tests-0123456789abc',
    FILES_DIR: folder,
    SMTP_URL: 'smtp://127.0.0.1:1',
    MAIL_FROM: 'Saltmarsh Sound Works <bench@saltmarsh.example>',
    STRIPE_KEY: 'sk_test_windchest',
    STRIPE_WEBHOOK_SECRET: 'whsec_windchest',
    STRIPE_HOST: '127.0.0.1',
    STRIPE_PORT: '1',
    STRIPE_PROTOCOL: 'http',
    JOB_CONCURRENCY: '0',
    RATE_LIMITS_OFF: '1',
    LOG_LEVEL: 'silent',
    ...testDatabase.environment,
    ...environment,
  });
  const mailer = new RecordingMailer();
  const clock = new TestClock();
  const building = Test.createTestingModule({ imports: [AppModule] })
    .overrideProvider(Mailer)
    .useValue(mailer)
    .overrideProvider(Clock)
    .useValue(clock);
  for (const [token, standIn] of standIns(clock)) building.overrideProvider(token).useValue(standIn);
  const module = await building.compile();
  const app = module.createNestApplication<NestExpressApplication>({ rawBody: true, logger: false });
  await furnishApp(app);
  await app.listen(0, '127.0.0.1');
  const url = (await app.getUrl()).replace('[::1]', '127.0.0.1');
  process.env = before;
  return {
    app,
    database: app.get<Sequelize>(getConnectionToken()),
    mailer,
    clock,
    url,
    drain: () => app.get(JobWorker).drain(),
    browser: () => supertest.agent(url).set('X-Windchest', '1'),
    stop: async () => {
      await app.close();
      await testDatabase.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
};
