import { createHash } from 'node:crypto';
import { buffer } from 'node:stream/consumers';
import type { OutputOf, RevisionDetail } from '@windchest/contracts';
import yauzl from 'yauzl';
import { keyOf, Storage } from '../adapters/storage/storage.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import { putKitOnSale } from '../testing/kit-on-sale.js';
import {
  boxStl,
  compare,
  draftKit,
  gateOf,
  offerLicence,
  readRevision,
  release,
  startRevision,
  upload,
  writeNotes,
} from '../testing/maker.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

type ShelfKit = OutputOf<'GET /shelf/:slug'>;

/** Names of a zip's entries, and its manifest. */
const openBundle = (zip: Buffer) =>
  new Promise<{ names: string[]; manifest: Record<string, unknown> }>((resolve, reject) => {
    const names: string[] = [];
    let manifest = {};
    yauzl.fromBuffer(zip, { lazyEntries: true }, (fault, file) => {
      if (fault) return reject(fault);
      file.on('entry', (entry: yauzl.Entry) => {
        names.push(entry.fileName);
        if (entry.fileName !== 'manifest.json') return file.readEntry();
        file.openReadStream(entry, (closed, contents) => {
          if (closed) return reject(closed);
          buffer(contents).then((bytes) => {
            manifest = JSON.parse(bytes.toString()) as Record<string, unknown>;
            file.readEntry();
          }, reject);
        });
      });
      file.on('end', () => resolve({ names: names.filter((name) => name.startsWith('parts/')), manifest }));
      file.readEntry();
    });
  });

const widths = { minus: 10.2, zero: 10, plus: 9.8 } as const;
const tongue = (widthMm: number) => boxStl(widthMm, 20, 30);

describe('a kit with a part in three clearances', () => {
  let shop: TestApp;
  let maker: Browser;
  let buyer: Browser;
  let slug: string;
  let kitId: string;
  let first: RevisionDetail;
  let entitlementId: string;
  let give: (kitId: string) => Promise<string>;

  const bundle = async (sha256: string): Promise<Buffer> =>
    buffer(await shop.app.get(Storage).get(keyOf('bundles', sha256)));
  const shelf = async (): Promise<ShelfKit> => (await buyer.get(`/api/shelf/${slug}`).expect(200)).body;
  const variantOf = (revision: RevisionDetail, clearance: 'minus' | 'plus') =>
    `/api/workshop/revisions/${revision.id}/parts/${revision.parts.find((part) => part.code === 'J-01')!.id}/variants/${clearance}`;

  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    ({ id: kitId, slug } = await draftKit(maker));
    await offerLicence(maker, kitId);
    const { id: personId, email } = await makePerson(shop, 'buyer');
    buyer = shop.browser();
    await buyer.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    give = async (given) => {
      const id = newId();
      await touchRows(
        shop.database,
        `INSERT INTO entitlements (id, person_id, email, kit_id, source, state, created_at, updated_at)
         VALUES (:id, :personId, :email, :given, 'gift', 'active', :now, :now)`,
        { id, personId, email, given, now: shop.clock.now() },
      );
      return id;
    };
    entitlementId = await give(kitId);
  });
  afterAll(() => shop.stop());

  it('takes variants by their names, in whatever order they come, and by choosing a mesh', async () => {
    const draft = await startRevision(maker, kitId);
    await upload(maker, draft.id, 'J-01 Locking tongue (minus).stl', tongue(widths.minus));
    const early = await readRevision(maker, draft.id);
    expect(early.parts).toMatchObject([
      { code: 'J-01', name: 'Locking tongue', file: null, variants: [{ clearance: 'minus' }] },
    ]);
    expect(gateOf(early, 'parts-measured').reason).toContain('J-01 has no file');

    const own = await upload(maker, draft.id, 'J-01 Locking tongue.stl', tongue(widths.zero));
    expect(own).toMatchObject({ partId: early.parts[0]!.id, clearance: 'zero' });
    await upload(maker, draft.id, 'G-01 Tongue gauge.stl', boxStl(30, 30, 6));
    const loose = await upload(maker, draft.id, 'Looser tongue.stl', tongue(widths.plus));
    const note = await upload(maker, draft.id, 'Tuning table.md', '# Tuning\n');

    const refused = async (fileId: string, words: RegExp) => {
      const { body } = await maker.put(variantOf(early, 'plus')).send({ fileId }).expect(400);
      expect(body.detail).toMatch(words);
    };
    await refused(own.id, /is J-01 itself, its clearance 0/);
    await refused(note.id, /“Tuning table\.md” is not a mesh/);
    const { body } = await maker.put(variantOf(early, 'plus')).send({ fileId: loose.id }).expect(200);
    expect(body).toMatchObject({
      code: 'J-01',
      variants: [{ clearance: 'minus' }, { clearance: 'plus', file: { fileName: 'Looser tongue.stl' } }],
    });
    const gauge = (await readRevision(maker, draft.id)).parts[0]!;
    expect(gauge).toMatchObject({ code: 'G-01', isGauge: false });
    await maker
      .put(`/api/workshop/revisions/${draft.id}/parts/${gauge.id}`)
      .send({
        code: 'G-01',
        name: 'Tongue gauge',
        quantity: 1,
        orientation: 'may-turn',
        printSpec: null,
        voice: null,
        isGauge: true,
      })
      .expect(200);

    // A mesh that was a part by itself no longer is; a file sent again under a variant's name replaces it.
    await upload(maker, draft.id, 'J-01 Narrow tongue (minus).stl', tongue(widths.minus));
    await shop.drain();
    const whole = await readRevision(maker, draft.id);
    expect(whole.parts.map((part) => part.code)).toEqual(['G-01', 'J-01']);
    expect(whole.parts[1]!.variants.map(({ file }) => file.fileName)).toEqual([
      'J-01 Narrow tongue (minus).stl',
      'Looser tongue.stl',
    ]);
    expect(gateOf(whole, 'parts-measured').reason).toBe('2 parts measured.');

    await writeNotes(maker, draft.id, { assemblyNotes: 'Push [[J-01]].' });
    first = await release(shop, maker, draft.id);
    expect(first.release).toEqual({ state: 'done', percent: 100, fault: null });
  });

  it('is released with four bundles: all clearances, and each by itself', async () => {
    expect(first.bundles.map((one) => one.clearance)).toEqual(['minus', 'zero', 'plus']);
    const files = {
      minus: 'parts/J-01 Narrow tongue (minus).stl',
      zero: 'parts/J-01 Locking tongue.stl',
      plus: 'parts/Looser tongue.stl',
    };
    const gauge = 'parts/G-01 Tongue gauge.stl';
    const whole = await openBundle(await bundle(first.bundle!.sha256));
    expect(whole.names).toEqual([gauge, files.zero, files.minus, files.plus]);
    expect(whole.manifest).toMatchObject({
      clearance: null,
      parts: [
        { code: 'G-01', isGauge: true, clearance: null, file: gauge, variants: [] },
        {
          code: 'J-01',
          clearance: 'zero',
          file: files.zero,
          sizeMm: [10, 20, 30],
          variants: [
            { clearance: 'minus', file: files.minus },
            { clearance: 'plus', file: files.plus },
          ],
        },
      ],
    });
    for (const { clearance, sha256, bytes } of first.bundles) {
      const zip = await bundle(sha256);
      expect([zip.length, createHash('sha256').update(zip).digest('hex')]).toEqual([bytes, sha256]);
      const { names, manifest } = await openBundle(zip);
      expect(names).toEqual([gauge, files[clearance]]);
      expect(manifest).toMatchObject({
        clearance,
        parts: [{ code: 'G-01' }, { clearance, file: files[clearance], variants: [] }],
      });
    }
    for (const [table, change] of [
      ['part_variants', `clearance = 'plus'`],
      ['revision_bundles', 'bytes = 1'],
    ])
      for (const sql of [
        `UPDATE ${table} SET ${change} WHERE revision_id = :id`,
        `DELETE FROM ${table} WHERE revision_id = :id`,
      ])
        await expect(touchRows(shop.database, sql, { id: first.id })).rejects.toThrow(/never changes/);
    await maker.delete(variantOf(first, 'plus')).expect(409);
  });

  it('hands out the clearance that is asked for, names it, and remembers it', async () => {
    expect(await shelf()).toMatchObject({
      clearance: { hasVariants: true, gauge: { code: 'G-01', name: 'Tongue gauge' }, chosen: null },
      newest: { bundles: [{ clearance: 'minus' }, { clearance: 'zero' }, { clearance: 'plus' }] },
      reprint: {
        parts: [
          { code: 'G-01', clearance: null },
          { code: 'J-01', clearance: null },
        ],
      },
    });
    const wish = { kitSlug: slug, revisionId: first.id };
    const whole = (await buyer.post('/api/shelf/grants').send(wish).expect(201)).body;
    expect(whole).toMatchObject({ fileName: `${slug}-mk-1.0.zip`, sha256: first.bundle!.sha256 });
    const plus = (
      await buyer
        .post('/api/shelf/grants')
        .send({ ...wish, clearance: 'plus' })
        .expect(201)
    ).body;
    expect(plus).toMatchObject({
      fileName: `${slug}-mk-1.0-clearance-plus.zip`,
      sha256: first.bundles[2]!.sha256,
    });
    const got = await buyer.get(plus.url).buffer(true).expect(200);
    expect(got.headers['etag']).toBe(`"${plus.sha256}"`);
    expect(got.headers['content-disposition']).toContain('-clearance-plus.zip');
    for (let tries = 0; tries < 100 && (await shelf()).clearance.chosen === null; tries++)
      await new Promise((resolve) => setTimeout(resolve, 20));
    expect(await shelf()).toMatchObject({
      clearance: { chosen: 'plus' },
      held: { id: first.id },
      downloads: [{ fileName: plus.fileName, isComplete: true }, { fileName: whole.fileName }],
    });
    expect(
      await selectRows(shop.database, 'SELECT COUNT(*) AS count FROM downloads WHERE entitlement_id = :id', {
        id: entitlementId,
      }),
    ).toEqual([{ count: 2 }]);
  });

  it('lists for each person what the clearance they print asks for', async () => {
    const draft = await startRevision(maker, kitId);
    expect(draft.parts).toMatchObject([
      { code: 'G-01', isGauge: true, variants: [] },
      { code: 'J-01', variants: [{ clearance: 'minus' }, { clearance: 'plus' }] },
    ]);
    await upload(maker, draft.id, 'J-01 Locking tongue (plus).stl', tongue(9.6));
    await shop.drain();
    expect((await compare(maker, draft.id)).rows).toMatchObject([
      { code: 'G-01', difference: 'same', variants: [] },
      {
        code: 'J-01',
        difference: 'changed',
        whatDiffers: expect.stringMatching(/^in \+: −0\.20 mm width/),
        variants: [
          { clearance: 'minus', difference: 'same' },
          { clearance: 'zero', difference: 'same' },
          { clearance: 'plus', difference: 'changed' },
        ],
      },
    ]);
    const mark = { code: 'J-01', mark: 'reprint needed', reason: 'It still stuck.' };
    await maker.put(`/api/workshop/revisions/${draft.id}/marks`).send(mark).expect(200);
    await writeNotes(maker, draft.id, { changeNotes: '### Fixed\n\n- [[J-01]] in + is narrower.' });
    await release(shop, maker, draft.id);

    const tongueFor = async (clearance: 'minus' | 'plus' | null) => {
      const { body } = await buyer.put(`/api/shelf/${slug}/clearance`).send({ clearance }).expect(200);
      expect((body as ShelfKit).clearance.chosen).toBe(clearance);
      return (body as ShelfKit).reprint.parts.find((part) => part.code === 'J-01');
    };
    const { mark: needed, reason } = mark;
    const steps = [{ revision: 'Mk 1.1', mark: needed, reason }];
    expect(await tongueFor('plus')).toMatchObject({
      clearance: 'plus',
      difference: 'changed',
      mark: needed,
      steps,
    });
    expect(await tongueFor('minus')).toMatchObject({ clearance: 'minus', difference: 'same', mark: null });
    expect(await tongueFor(null)).toMatchObject({ clearance: null, difference: 'changed', mark: needed });
  });

  it('says no where there is no such bundle, kit or clearance', async () => {
    const plainKit = await putKitOnSale(shop);
    await give(plainKit.kitId);
    const { body } = await buyer
      .post('/api/shelf/grants')
      .send({ kitSlug: plainKit.slug, revisionId: plainKit.revisionId, clearance: 'plus' })
      .expect(404);
    expect(body.detail).toBe('Mk 1.4 has no bundle of that clearance. Take its whole bundle.');
    const { id } = await draftKit(maker, 'Plain');
    await buyer.put('/api/shelf/no-such-kit/clearance').send({ clearance: 'plus' }).expect(404);
    await buyer.put(`/api/shelf/${slug}/clearance`).send({ clearance: 'wide' }).expect(422);
    const draft = await startRevision(maker, id);
    await upload(maker, draft.id, 'B-01 Bar.stl', boxStl(5, 6, 7));
    const plain = await readRevision(maker, draft.id);
    const at = `/api/workshop/revisions/${draft.id}/parts/${plain.parts[0]!.id}/variants`;
    await maker.delete(`${at}/plus`).expect(404);
    await maker.put(`${at}/zero`).send({ fileId: plain.parts[0]!.file!.id }).expect(404);
    const loose = await upload(maker, draft.id, 'B-01 Bar (plus).stl', boxStl(5, 6, 6.8));
    await maker.delete(`${at}/plus`).expect(200);
    expect((await readRevision(maker, draft.id)).parts[0]!.variants).toEqual([]);
    await maker.delete(`/api/workshop/revisions/${draft.id}/files/${loose.id}`).expect(404);
  });
});
