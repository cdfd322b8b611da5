import type { KitPart } from '@windchest/contracts';
import { RenewMeasurements } from '../catalogue/files/renew-measurements.js';
import { selectRows, touchRows } from '../database/rows.js';
import { boxStl, draftKit, readRevision, releasedKit, startRevision, upload } from '../testing/maker.js';
import { signInAs } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';
import { MeshRunner, type MeshOutcome } from './mesh-runner.js';

describe('previews of parts', () => {
  let shop: TestApp;
  let maker: Browser;
  let visitor: Browser;
  let slug: string;
  let revisionId: string;

  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    visitor = shop.browser();
    const made = await releasedKit(shop, maker);
    slug = made.kit.slug;
    revisionId = made.revision.id;
  });
  afterAll(() => shop.stop());

  const partOf = async (code: string): Promise<KitPart> =>
    ((await visitor.get(`/api/kits/${slug}/parts`).expect(200)).body as KitPart[]).find(
      (part) => part.code === code,
    )!;
  const fetchPreview = (browser: Browser, path: string) =>
    browser
      .get(path)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      });

  it('are for everybody, small, and kept by browsers only under their hash', async () => {
    const { previewBytes, previewSha256 } = await partOf('J-01');
    const path = `/api/kits/${slug}/parts/J-01/preview`;
    const named = await fetchPreview(visitor, `${path}?v=${previewSha256}`).expect(200);
    const glb = named.body as Buffer;
    expect(glb.subarray(0, 4).toString()).toBe('glTF');
    expect(glb.length).toBe(previewBytes);
    expect(glb.length).toBeLessThanOrEqual(60_000);
    expect(named.headers).toMatchObject({
      'content-type': 'model/gltf-binary',
      'cache-control': 'public, max-age=31536000, immutable',
      etag: `W/"${previewSha256}"`,
    });
    const unnamed = await fetchPreview(visitor, path).expect(200);
    expect(unnamed.headers['cache-control']).toBe('public, no-cache');
    const old = await fetchPreview(visitor, `${path}?v=${'ab'.repeat(32)}`).expect(200);
    expect(old.headers['cache-control']).toBe('public, no-cache');
    await visitor.get(path).set('If-None-Match', `W/"${previewSha256}"`).expect(304);
  });

  it('are refused with a sentence where there is none', async () => {
    const { body } = await visitor.get(`/api/kits/${slug}/parts/X-99/preview`).expect(404);
    expect(body.detail).toBe('There is no preview of this part. One is made when its file is measured.');
    await visitor.get('/api/kits/no-such-kit/parts/J-01/preview').expect(404);
  });

  it('of a draft are for staff', async () => {
    const draft = await startRevision(maker, (await draftKit(maker, 'Hidden')).id);
    await upload(maker, draft.id, 'A-01 Box.stl', boxStl(30, 20, 10));
    await shop.drain();
    const [part] = (await readRevision(maker, draft.id)).parts;
    expect(part).toMatchObject({ previewBytes: expect.any(Number), previewSha256: expect.any(String) });
    const path = `/api/workshop/revisions/${draft.id}/parts/${part!.id}/preview`;
    const helper = await signInAs(shop, 'helper');
    const { headers } = await fetchPreview(helper, path).expect(200);
    expect(headers['cache-control']).toBe('private, no-cache');
    await visitor.get(path).expect(401);
    await (await signInAs(shop, 'buyer')).get(path).expect(403);
    await helper.get(`/api/workshop/revisions/${revisionId}/parts/${part!.id}/preview`).expect(404);
  });

  describe('after an upgrade', () => {
    const measuredLongAgo = () =>
      touchRows(
        shop.database,
        `UPDATE measurements SET measurer_version = 2, preview_sha256 = NULL,
         measurement = JSON_REMOVE(measurement, '$.previewBytes')`,
      );
    const start = async (): Promise<void> => {
      await touchRows(shop.database, `DELETE FROM jobs WHERE dedupe_key LIKE 'measure%'`);
      await shop.app.get(RenewMeasurements, { strict: false }).onApplicationBootstrap();
    };
    /** Renewals are spread over time, and a failed one waits a while. */
    const settle = async (): Promise<void> => {
      for (let times = 0; times < 3; times++) {
        await shop.drain();
        shop.clock.advance(60);
      }
    };
    const released = async () => ({
      revision: await selectRows(shop.database, 'SELECT * FROM revisions WHERE id = :revisionId', {
        revisionId,
      }),
      parts: await selectRows(shop.database, 'SELECT * FROM parts WHERE revision_id = :revisionId', {
        revisionId,
      }),
      files: await selectRows(shop.database, 'SELECT * FROM revision_files WHERE revision_id = :revisionId', {
        revisionId,
      }),
    });

    it('are made for released kits too, and nothing of the released revision changes', async () => {
      const before = await released();
      const { previewSha256, ...part } = await partOf('H-03');
      await measuredLongAgo();
      expect(await partOf('H-03')).toMatchObject({
        previewBytes: null,
        previewSha256: null,
        sizeMm: { x: 60 },
      });
      await visitor.get(`/api/kits/${slug}/parts/H-03/preview`).expect(404);
      await start();
      await settle();
      expect(await partOf('H-03')).toEqual({ ...part, previewSha256 });
      expect(await released()).toEqual(before);
    });

    it('are wanted once, however many processes start', async () => {
      const renewals = () =>
        selectRows(shop.database, `SELECT id FROM jobs WHERE name = 'catalogue.renew-measurement'`);
      await measuredLongAgo();
      await start();
      await settle();
      const first = await renewals();
      await shop.app.get(RenewMeasurements, { strict: false }).onApplicationBootstrap();
      await settle();
      expect(await renewals()).toEqual(first);
      expect(first).toHaveLength(3);
    });

    it('leave a part as it was that the newer measurer cannot read', async () => {
      const runner = shop.app.get(MeshRunner, { strict: false });
      const run = runner.run.bind(runner);
      const answers: MeshOutcome[] = [
        { isMeasured: false, code: 'timed-out', fault: 'takes longer than 600 s to measure.' },
        { isMeasured: false, code: 'bad-number', fault: 'has a corner that is no number.' },
      ];
      await measuredLongAgo();
      runner.run = (task) =>
        task.fileName.startsWith('H-03') ? Promise.resolve(answers.shift()!) : run(task);
      await start();
      await settle();
      runner.run = run;
      expect(answers).toEqual([]);
      const part = await partOf('H-03');
      expect(part).toMatchObject({ previewBytes: null, sizeMm: { x: 60, y: 60, z: 12 } });
      expect(part.drawing?.path).toMatch(/^M/);
      expect((await partOf('J-01')).previewBytes).toBeGreaterThan(0);
    });
  });
});
