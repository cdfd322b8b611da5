// needs: stand
import { join } from 'node:path';
import nodemailer from 'nodemailer';
import { pause, prepareLetterRun, type LetterRun } from '../testing/letter-run.js';

/**
 * A letter to ten thousand readers, sent by two processes of the API that are killed twice half way, to a mail
 * server that keeps what arrives: everybody gets it once, the pace is kept, memory stays flat. Then how fast it
 * goes without a pace, beside a bare pooled nodemailer loop in the same run. Each part has a database of its own.
 */
const READERS = Number(process.env['WINDCHEST_READERS'] ?? '10000');
const PER_MINUTE = 12_000;
for (const name of ['HOST', 'PORT', 'USER', 'PASSWORD'])
  process.env[`WINDCHEST_TEST_DB_${name}`] ??= process.env[`WINDCHEST_DB_${name}`];
const main = join(process.cwd(), 'apps/api/dist/main.js');
const say = (text: string): boolean => process.stdout.write(`${text}\n`);

const untilSent = async (run: LetterRun): Promise<void> => {
  while ((await run.stateOfLetter()) !== 'sent') await pause(200);
};
const checkOnce = (run: LetterRun, what: string): void => {
  const mails = [...run.mailsByReader().values()];
  const twice = mails.filter((count) => count > 1).length;
  say(`${what}: ${mails.length} of ${READERS} readers reached, ${twice} twice`);
  if (mails.length !== READERS || twice > 0) process.exitCode = 1;
};

const withKills = async (): Promise<void> => {
  const run = await prepareLetterRun(main, READERS);
  try {
    const processes = [await run.start(), await run.start()];
    const rss: number[] = [];
    const perSecond: number[] = [];
    let before = 0;
    const watch = setInterval(() => {
      perSecond.push(run.sink.mails.length - before);
      before = run.sink.mails.length;
      rss.push(Math.max(...processes.map((api) => run.rssMib(api)).filter((mib) => mib > 0)));
    }, 1000);
    await run.send(PER_MINUTE);
    for (const [which, share] of [
      [0, 1 / 3],
      [1, 2 / 3],
    ] as const) {
      while (run.sink.mails.length < READERS * share) await pause(20);
      await run.kill(processes[which]!);
      say(`killed one of two processes after ${run.sink.mails.length} mails`);
      processes[which] = await run.start();
    }
    await untilSent(run);
    clearInterval(watch);
    checkOnce(run, 'with two kills');
    const under = perSecond.filter((count) => count > 0);
    say(
      `pace: at most ${PER_MINUTE / 60} mails a second asked; ${Math.max(...under)} in the fullest second, ${Math.round(under.reduce((all, one) => all + one, 0) / under.length)} on average`,
    );
    say(
      `memory of the larger process: ${rss[0]} MiB at the start, ${Math.max(...rss)} MiB at most, ${rss.at(-1)} MiB at the end`,
    );
  } finally {
    await run.stop();
  }
};

const atFullSpeed = async (): Promise<void> => {
  const run = await prepareLetterRun(main, READERS);
  try {
    await Promise.all([run.start(), run.start()]);
    await run.send(4_000_000);
    while (run.sink.mails.length === 0) await pause(5);
    const startedAt = performance.now();
    await untilSent(run);
    const letters = READERS / ((performance.now() - startedAt) / 1000);
    checkOnce(run, 'at full speed');
    const sample = run.sink.mails[0] ?? '';
    const html = sample.slice(0, Math.min(sample.length, 12_000));
    run.sink.mails.length = 0;
    const bare = nodemailer.createTransport({
      host: '127.0.0.1',
      port: run.sink.port,
      pool: true,
      maxConnections: 32,
      maxMessages: Infinity,
    });
    const bareAt = performance.now();
    await Promise.all(
      Array.from({ length: READERS }, (_, at) =>
        bare.sendMail({
          from: 'bench@saltmarsh.example',
          to: `reader-${at}@mail.example`,
          subject: 'x',
          html,
          text: 'x',
        }),
      ),
    );
    const loop = READERS / ((performance.now() - bareAt) / 1000);
    bare.close();
    say(
      `speed: ${Math.round(letters)} letters a second from two processes, ${Math.round(loop)} from a bare pooled nodemailer loop that keeps no record`,
    );
  } finally {
    await run.stop();
  }
};

await withKills();
await atFullSpeed();
