import { Injectable, Module } from '@nestjs/common';
import { DiscoveryModule, NestFactory } from '@nestjs/core';
import { z } from 'zod';
import { touchRows, selectRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { JobQueue } from './job-queue.js';
import { JobRegistry } from './job-registry.js';
import { JobWorker } from './job-worker.js';
import { sendMail } from '../mails/send-mail.job.js';
import { HandlesJob, TryLater, type JobHandler } from './job.js';

describe('the outbox of jobs', () => {
  let shop: TestApp;
  let handled: string[] = [];
  let behave: (id: string) => Promise<void> = () => Promise.resolve();

  beforeAll(async () => {
    shop = await startTestApp();
    // The mail job's handler is replaced, so that these specs see each run.
    const registry = shop.app.get(JobRegistry, { strict: false });
    registry.find = (name) =>
      name === sendMail.name
        ? {
            definition: { ...sendMail, attempts: 3, retryAfterSeconds: () => 10 },
            handler: {
              handle: async ({ mailId }: { mailId: string }) => (handled.push(mailId), behave(mailId)),
            } as never,
          }
        : undefined;
  });
  afterAll(() => shop.stop());
  beforeEach(async () => {
    handled = [];
    behave = () => Promise.resolve();
    await shop.database.query('DELETE FROM jobs');
  });

  const id = (n: number): string => `00000000-0000-7000-8000-${String(n).padStart(12, '0')}`;
  const add = (n: number, options = {}) =>
    shop.app
      .get(Transactions, { strict: false })
      .run((tx) => shop.app.get(JobQueue, { strict: false }).add(tx, sendMail, { mailId: id(n) }, options));
  const jobs = () =>
    selectRows<{ state: string; attempts: number; last_error: string | null }>(
      shop.database,
      'SELECT state, attempts, last_error FROM jobs ORDER BY id',
    );

  it('are written with what causes them, or not at all', async () => {
    const transactions = shop.app.get(Transactions, { strict: false });
    const queue = shop.app.get(JobQueue, { strict: false });
    await expect(
      transactions.run(async (tx) => {
        await queue.add(tx, sendMail, { mailId: id(1) });
        throw new Error('the cause fell through');
      }),
    ).rejects.toThrow('fell through');
    expect(await jobs()).toEqual([]);
  });

  it('run once each, though four workers take them side by side', async () => {
    for (let n = 0; n < 40; n++) await add(n);
    await Promise.all(Array.from({ length: 4 }, () => shop.drain()));
    expect(handled).toHaveLength(40);
    expect(new Set(handled).size).toBe(40);
  });

  it('are written once for one key', async () => {
    await add(1, { key: 'same' });
    await add(2, { key: 'same' });
    await shop.drain();
    expect(handled).toEqual([id(1)]);
  });

  it('wait for their time', async () => {
    await add(1, { runAt: shop.clock.in(60) });
    expect(await shop.drain()).toBe(0);
    shop.clock.advance(61);
    expect(await shop.drain()).toBe(1);
    shop.clock.advance(-61);
  });

  it('are tried again after a failure and are dead after the last try, with the reason', async () => {
    behave = () => Promise.reject(new Error('the server was away'));
    await add(1);
    for (let tries = 0; tries < 5; tries++) {
      await shop.drain();
      shop.clock.advance(11);
    }
    expect(handled).toHaveLength(3);
    expect(await jobs()).toEqual([{ state: 'dead', attempts: 3, last_error: 'the server was away' }]);
    shop.clock.advance(-55);
  });

  it('may ask to run later without counting it as a failure', async () => {
    let isReady = false;
    behave = () => (isReady ? Promise.resolve() : Promise.reject(new TryLater(5)));
    await add(1);
    for (let tries = 0; tries < 6; tries++) {
      await shop.drain();
      shop.clock.advance(6);
    }
    isReady = true;
    await shop.drain();
    expect(await jobs()).toEqual([{ state: 'done', attempts: 1, last_error: null }]);
    shop.clock.advance(-36);
  });

  it('are taken over when the process that held them died', async () => {
    await add(1);
    await touchRows(
      shop.database,
      `UPDATE jobs SET state = 'running', attempts = 1, leased_by = 'a process that is gone', leased_until = :until`,
      { until: shop.clock.in(30) },
    );
    expect(await shop.drain()).toBe(0);
    shop.clock.advance(31);
    expect(await shop.drain()).toBe(1);
    shop.clock.advance(-31);
    expect(handled).toEqual([id(1)]);
  });

  it('leave the finishing to the new holder when the lease was lost meanwhile', async () => {
    behave = async () => {
      await touchRows(shop.database, `UPDATE jobs SET leased_by = 'somebody else'`);
    };
    await add(1);
    await shop.app.get(JobWorker, { strict: false }).drain();
    expect((await jobs())[0]?.state).toBe('running');
  });
});

describe('booting', () => {
  it('is refused for a kind of job that nobody handles', async () => {
    @Module({ imports: [DiscoveryModule], providers: [JobRegistry] })
    class WithoutHandlers {}
    await expect(
      NestFactory.createApplicationContext(WithoutHandlers, { logger: false, abortOnError: false }),
    ).rejects.toThrow(/No handler for the job/);
  });

  it('is refused for a kind of job that two handle', async () => {
    @Injectable()
    @HandlesJob(sendMail)
    class One implements JobHandler<z.ZodType> {
      handle = () => Promise.resolve();
    }
    @Injectable()
    @HandlesJob(sendMail)
    class Two implements JobHandler<z.ZodType> {
      handle = () => Promise.resolve();
    }
    @Module({ imports: [DiscoveryModule], providers: [JobRegistry, One, Two] })
    class WithTwo {}
    await expect(
      NestFactory.createApplicationContext(WithTwo, { logger: false, abortOnError: false }),
    ).rejects.toThrow(/Two handlers want the job mails\.send/);
  });
});
