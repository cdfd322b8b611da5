import { createReadStream } from 'node:fs';
import type { Comparison } from '@windchest/contracts';
import { Storage } from '../../adapters/storage/storage.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { MeshRunner, type MeshPairOutcome } from '../../measuring/mesh-runner.js';
import {
  boxStl,
  compare,
  fannedBoxStl,
  gateOf,
  readRevision,
  release,
  releasedKit,
  startRevision,
  upload,
  writeNotes,
} from '../../testing/maker.js';
import { signInAs } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';
import { CatalogueReader } from '../catalogue-reader.js';

type Row = Comparison['rows'][number];

describe('the comparison of two revisions', () => {
  let shop: TestApp;
  let maker: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
  });
  afterAll(() => shop.stop());

  const tongue = 'J-01 Locking tongue.stl';
  const foot = 'H-03 Foot.stl';
  const rowOf = async (revisionId: string, code: string, withId?: string): Promise<Row> =>
    (await compare(maker, revisionId, withId)).rows.find((row) => row.code === code)!;
  const mark = (revisionId: string, code: string, reason: string) =>
    maker
      .put(`/api/workshop/revisions/${revisionId}/marks`)
      .send({ code, mark: 'reprint needed', reason })
      .expect(200);
  const pairs = () =>
    selectRows<{ before_sha: string; state: string; tries: number }>(
      shop.database,
      'SELECT before_sha, state, tries FROM mesh_comparisons ORDER BY created_at',
    );
  const compareInstead = (compareFiles: () => Promise<MeshPairOutcome>): (() => void) => {
    const runner = shop.app.get(MeshRunner, { strict: false });
    const before = runner.compare.bind(runner);
    runner.compare = compareFiles;
    return () => (runner.compare = before);
  };

  it('finds the place of a change and the same shape in other triangles, and holds the release until then', async () => {
    const { kit, revision } = await releasedKit(shop, maker, 'Deep');
    const draft = await startRevision(maker, kit.id);
    await writeNotes(maker, draft.id, { changeNotes: '### Fixed\n\n- The tongue locks.' });
    const goOn = compareInstead(() => Promise.reject(new Error('the process went away')));
    await upload(maker, draft.id, tongue, boxStl(20, 30, 40.42));
    await upload(maker, draft.id, foot, fannedBoxStl(60, 60, 12));
    await shop.drain();

    const waiting = await compare(maker, draft.id);
    expect(waiting.rows).toMatchObject([
      { code: 'H-03', difference: 'changed', deviation: { state: 'waiting', placeMm: null } },
      { code: 'J-01', difference: 'changed', deviation: { state: 'waiting' } },
    ]);
    await mark(draft.id, 'J-01', 'Too short to lock.');
    await mark(draft.id, 'H-03', 'Said before it was known.');
    expect(gateOf(await readRevision(maker, draft.id), 'changes-marked')).toMatchObject({
      state: 'open',
      mayBeWaived: false,
      reason: 'H-03, J-01 are being compared with the last revision.',
    });
    const { body } = await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(409);
    expect(body.detail).toContain('are being compared');

    goOn();
    shop.clock.advance(1000);
    await shop.drain();
    const { rows } = await compare(maker, draft.id);
    expect(rows).toMatchObject([
      {
        code: 'H-03',
        difference: 're-exported',
        whatDiffers: 'the same shape, exported again',
        mark: null,
        deviation: { state: 'compared', placeMm: null },
      },
      {
        code: 'J-01',
        difference: 'changed',
        deviation: {
          state: 'compared',
          placeIsOn: 'after',
          where: expect.stringMatching(/^up to 0\.42 mm, at the top(, .*)? \(\d+\.0, \d+\.0, 40\.4 mm\)$/),
          boxMm: { min: { x: 0, y: 0, z: 0 }, max: { x: 20, y: 30, z: expect.closeTo(40.42, 4) } },
        },
      },
    ]);
    expect(rows[1]!.deviation!.largestMm).toBeCloseTo(0.42, 4);
    // One row for each pair, however often somebody looked; the tries before count.
    expect(await pairs()).toMatchObject([
      { state: 'compared', tries: 2 },
      { state: 'compared', tries: 2 },
    ]);
    expect(await release(shop, maker, draft.id)).toMatchObject({ state: 'released' });

    // The shelf rests on the same knowledge: the foot is not to be printed again.
    const reader = shop.app.get(CatalogueReader);
    expect(await reader.netDifferences(revision.id, draft.id, null)).toMatchObject([
      { code: 'H-03', difference: 're-exported', steps: [] },
      {
        code: 'J-01',
        difference: 'changed',
        steps: [{ mark: 'reprint needed', reason: 'Too short to lock.' }],
      },
    ]);

    // The tongue goes back to what it was, in other triangles.
    const third = await startRevision(maker, kit.id);
    await writeNotes(maker, third.id, { changeNotes: '### Changed\n\n- The tongue is short again.' });
    await upload(maker, third.id, tongue, fannedBoxStl(20, 30, 40));
    await shop.drain();
    expect(await rowOf(third.id, 'J-01')).toMatchObject({
      difference: 'changed',
      deviation: { state: 'compared', where: expect.stringMatching(/^up to 0\.42 mm, at the top/) },
    });
    // With the first revision it is compared when somebody asks.
    expect(await rowOf(third.id, 'J-01', revision.id)).toMatchObject({ deviation: { state: 'waiting' } });
    await shop.drain();
    expect(await rowOf(third.id, 'J-01', revision.id)).toMatchObject({ difference: 're-exported' });
    await mark(third.id, 'J-01', 'Locked too hard.');
    await release(shop, maker, third.id);
    const fromFirst = await reader.netDifferences(revision.id, third.id, null);
    expect(fromFirst.map((row) => [row.code, row.difference, row.steps[0]?.mark ?? null])).toEqual([
      ['H-03', 're-exported', null],
      ['J-01', 're-exported', null],
    ]);
    expect((await reader.netDifferences(draft.id, third.id, null))[1]).toMatchObject({
      difference: 'changed',
      // The mark that the foot got before it was known to be the same went with the draft.
      steps: [{ reason: 'Locked too hard.' }],
    });
  });

  it('has a release compared with all older revisions, before a holder of one looks at the shelf', async () => {
    const { kit, revision } = await releasedKit(shop, maker, 'Older');
    const heights = [40.5, 41];
    for (const height of heights) {
      const next = await startRevision(maker, kit.id);
      await upload(maker, next.id, tongue, boxStl(20, 30, height));
      await writeNotes(maker, next.id, { changeNotes: '### Changed\n\n- Taller.' });
      await shop.drain();
      await mark(next.id, 'J-01', 'Taller.');
      expect((await release(shop, maker, next.id)).state).toBe('released');
    }
    const firstTongue = revision.parts.find((part) => part.code === 'J-01')!.file!.sha256;
    const mine = (await pairs()).filter((pair) => pair.before_sha === firstTongue);
    expect(mine.slice(-2).map((pair) => pair.state)).toEqual(['compared', 'compared']);
  });

  it('goes clearance by clearance, before anybody looks, and is made up for where it is missing', async () => {
    const { kit } = await releasedKit(shop, maker, 'Loose');
    const loose = 'J-01 Locking tongue (plus).stl';
    const first = await startRevision(maker, kit.id);
    await upload(maker, first.id, loose, boxStl(19.8, 30, 40));
    await writeNotes(maker, first.id, { changeNotes: '### Added\n\n- A looser tongue.' });
    await shop.drain();
    expect((await release(shop, maker, first.id)).state).toBe('released');

    const second = await startRevision(maker, kit.id);
    const { sha256 } = await upload(maker, second.id, loose, boxStl(19.6, 30, 40));
    await writeNotes(maker, second.id, { changeNotes: '### Changed\n\n- Looser still.' });
    await shop.drain();
    const mine = () =>
      selectRows<{ state: string }>(
        shop.database,
        'SELECT state FROM mesh_comparisons WHERE after_sha = :sha256',
        { sha256 },
      );
    expect(await mine()).toEqual([{ state: 'compared' }]);
    expect(await rowOf(second.id, 'J-01')).toMatchObject({
      difference: 'changed',
      deviation: {
        clearance: 'plus',
        where: expect.stringMatching(/^in \+: up to 0\.20 mm, .*at the right/),
      },
    });
    await mark(second.id, 'J-01', 'Still too tight.');

    // As in a shop that knew no comparing before: asking for the release asks for it.
    await touchRows(shop.database, 'DELETE FROM mesh_comparisons WHERE after_sha = :sha256', { sha256 });
    const { body } = await maker.post(`/api/workshop/revisions/${second.id}/release`).expect(409);
    expect(body.detail).toContain('J-01 is being compared');
    await shop.drain();
    await maker.post(`/api/workshop/revisions/${second.id}/release`).expect(202);
    await shop.drain();
    expect((await readRevision(maker, second.id)).state).toBe('released');
  });

  it('says in a sentence why two shapes could not be compared, and tries again when the file is sent again', async () => {
    const { kit } = await releasedKit(shop, maker, 'Slow');
    const draft = await startRevision(maker, kit.id);
    const restore = compareInstead(() =>
      Promise.resolve({
        isCompared: false,
        code: 'timed-out',
        fault: 'comparing the two files takes longer than 600 s.',
      }),
    );
    const file = await upload(maker, draft.id, tongue, boxStl(20, 30, 43));
    await shop.drain();
    expect(await rowOf(draft.id, 'J-01')).toMatchObject({
      difference: 'changed',
      whatDiffers: expect.stringContaining('+3.00 mm height'),
      deviation: {
        state: 'failed',
        largestMm: null,
        where: 'where it differs is not known: comparing the two files takes longer than 600 s.',
      },
    });
    // What is measured counts all the same: the maker marks it, and the release goes on.
    await mark(draft.id, 'J-01', 'Taller.');
    expect(gateOf(await readRevision(maker, draft.id), 'changes-marked').state).toBe('passed');

    restore();
    await maker.delete(`/api/workshop/revisions/${draft.id}/files/${file.id}`).expect(204);
    await upload(maker, draft.id, tongue, boxStl(20, 30, 43));
    // A store on another machine: the files are copied here for the work.
    const storage = shop.app.get(Storage);
    const { localPath, get } = storage;
    storage.get = (key) => Promise.resolve(createReadStream(localPath.call(storage, key)!));
    storage.localPath = () => null;
    await shop.drain();
    Object.assign(storage, { localPath, get });
    expect(await rowOf(draft.id, 'J-01')).toMatchObject({ deviation: { state: 'compared' } });
  });

  it('gives a pair up whose comparing never comes to an end', async () => {
    const { kit } = await releasedKit(shop, maker, 'Endless');
    const draft = await startRevision(maker, kit.id);
    const restore = compareInstead(() => Promise.reject(new Error('the process went away')));
    await upload(maker, draft.id, tongue, boxStl(20, 30, 44));
    for (let run = 0; run < 8; run++) {
      await shop.drain();
      shop.clock.advance(1000);
    }
    restore();
    expect((await rowOf(draft.id, 'J-01')).deviation).toMatchObject({
      state: 'failed',
      where: expect.stringContaining('did not come to an end in 4 tries'),
    });
  });
});
