import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pause, prepareLetterRun, type LetterRun } from '../testing/letter-run.js';

const READERS = 200;
const main = join(process.cwd(), 'apps/api/dist/main.js');

/** Two processes of the API send one letter; one of them is killed half way, and another takes its place. */
describe('a letter on its way when a process is killed', () => {
  let run: LetterRun;
  beforeAll(async () => {
    if (!existsSync(main))
      throw new Error('apps/api/dist/main.js is missing: build the server first (`npm run build:server`).');
    run = await prepareLetterRun(main, READERS);
  });
  afterAll(() => run.stop());

  it('reaches everybody once', async () => {
    const [first] = await Promise.all([run.start(), run.start()]);
    await run.send(6000);
    while (run.sink.mails.length < READERS / 4) await pause(10);
    await run.kill(first);
    expect(run.sink.mails.length).toBeLessThan(READERS);
    for (let tries = 0; tries < 200 && (await run.stateOfLetter()) !== 'sent'; tries++) await pause(100);
    expect(await run.counts()).toEqual({ sent: READERS });
    const mails = run.mailsByReader();
    expect([mails.size, Math.max(...mails.values())]).toEqual([READERS, 1]);
  });
});
