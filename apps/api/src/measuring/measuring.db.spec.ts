import { JobQueue } from '../jobs/job-queue.js';
import { Transactions } from '../database/transactions.js';
import { boxStl, draftKit, readRevision, startRevision, upload } from '../testing/maker.js';
import { signInAs } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';
import { measureFile } from '../catalogue/files/measure-file.job.js';
import { MeshRunner, type MeshOutcome, type MeshTask } from './mesh-runner.js';

describe('the measuring room', () => {
  let shop: TestApp;
  let maker: Browser;
  let revisionId: string;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    revisionId = (await startRevision(maker, (await draftKit(maker)).id)).id;
  });
  afterAll(() => shop.stop());
  const partFile = async (code: string) =>
    (await readRevision(maker, revisionId)).parts.find((part) => part.code === code)!.file!;
  const runInstead = (run: (task: MeshTask) => Promise<MeshOutcome>): (() => void) => {
    const runner = shop.app.get(MeshRunner, { strict: false });
    const before = runner.run.bind(runner);
    runner.run = run;
    return () => (runner.run = before);
  };

  it('names in a fault the file as it is named where it stands', async () => {
    const cut = boxStl(4, 4, 4).subarray(0, 300);
    await upload(maker, revisionId, 'A-01 One.stl', cut);
    await shop.drain();
    await upload(maker, revisionId, 'A-02 Two.stl', cut);
    expect((await partFile('A-01')).fault).toMatch(/^“A-01 One.stl” /);
    expect((await partFile('A-02')).fault).toMatch(/^“A-02 Two.stl” /);
  });

  it('keeps a passing fault of its own as a sentence, and tries again when the file is sent again', async () => {
    const stl = boxStl(4, 4, 5);
    const restore = runInstead(() =>
      Promise.resolve({ isMeasured: false, code: 'timed-out', fault: 'takes longer than 600 s to measure.' }),
    );
    await upload(maker, revisionId, 'B-01 Slow.stl', stl);
    await shop.drain();
    expect((await partFile('B-01')).fault).toBe('“B-01 Slow.stl” takes longer than 600 s to measure.');
    restore();
    await maker
      .delete(`/api/workshop/revisions/${revisionId}/files/${(await partFile('B-01')).id}`)
      .expect(204);
    await upload(maker, revisionId, 'B-01 Slow.stl', stl);
    await shop.drain();
    expect(await partFile('B-01')).toMatchObject({ measuring: 'measured', fault: null });
  });

  it('gives a file up whose measuring never comes to an end', async () => {
    const file = await upload(maker, revisionId, 'C-01 Deadly.stl', boxStl(4, 4, 6));
    const restore = runInstead(() => Promise.reject(new Error('the process went away')));
    for (let run = 0; run < 8; run++) {
      await shop.drain();
      shop.clock.advance(1000);
    }
    restore();
    expect(await partFile('C-01')).toMatchObject({ measuring: 'refused' });
    expect((await partFile('C-01')).fault).toMatch(/could not be measured in 4 tries/);
    expect(file.measuring).toBe('waiting');
  });

  it('does nothing for a file that is measured already', async () => {
    const file = await upload(maker, revisionId, 'D-01 Done.stl', boxStl(4, 4, 7));
    await shop.drain();
    let runs = 0;
    const restore = runInstead(() => {
      runs += 1;
      return Promise.reject(new Error('not to be called'));
    });
    await shop.app
      .get(Transactions)
      .run((tx) => shop.app.get(JobQueue).add(tx, measureFile, { sha256: file.sha256, fileName: 'x.stl' }));
    await shop.drain();
    restore();
    expect(runs).toBe(0);
    expect(await partFile('D-01')).toMatchObject({ measuring: 'measured' });
  });
});
