import { createHash } from 'node:crypto';
import type { OutputOf, RevisionDetail } from '@windchest/contracts';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { CollectChangedBundles } from '../../catalogue/changed-parts/collect-changed-bundles.js';
import { newId } from '../../database/columns.js';
import { selectRows, touchRows } from '../../database/rows.js';
import {
  boxStl,
  draftKit,
  offerLicence,
  release,
  startRevision,
  upload,
  writeNotes,
} from '../../testing/maker.js';
import { putOnShelf } from '../../testing/released-revision.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';
import { Withdrawals } from '../withdrawals/withdrawals.js';
import { ReprintLists } from './reprint-lists.js';

type Plan = OutputOf<'GET /shelf/:slug/reprint'>;
type Record = OutputOf<'GET /shelf/:slug/printed'>;

/** Names of a zip's entries, from its central directory (APPNOTE 4.3.12: signature PK 01 02, name after 46 bytes). */
const namesOf = (zip: Buffer): string[] => {
  const names: string[] = [];
  for (let at = zip.indexOf('PK\x01\x02'); at >= 0; at = zip.indexOf('PK\x01\x02', at + 46))
    names.push(zip.subarray(at + 46, at + 46 + zip.readUInt16LE(at + 28)).toString());
  return names;
};

describe('prints, and what to print again', () => {
  let shop: TestApp;
  let maker: Browser;
  let pia: Browser;
  let piaId: string;
  let email: string;
  let kitId: string;
  let slug: string;
  const made: RevisionDetail[] = [];

  const plan = async (revision?: RevisionDetail): Promise<Plan> =>
    (
      await pia
        .get(`/api/shelf/${slug}/reprint`)
        .query(revision ? { revision: revision.id } : {})
        .expect(200)
    ).body;
  const toPrint = async (revision?: RevisionDetail) =>
    (await plan(revision)).list.parts
      .filter(({ advice }) => advice !== null)
      .map(({ code, advice, print, optional }) => `${code} ${advice} ${print}+${optional}`);
  const printed = (record: Record) =>
    record.parts.map((part) => `${part.code} ${part.printed}/${part.quantity}`);
  const say = async (revision: RevisionDetail, code: string, quantity: number): Promise<Record> =>
    (
      await pia
        .put(`/api/shelf/${slug}/printed`)
        .send({ revisionId: revision.id, code, quantity })
        .expect(200)
    ).body;
  const mark = (revision: RevisionDetail, code: string, reprint: string, reason: string) =>
    maker
      .put(`/api/workshop/revisions/${revision.id}/marks`)
      .send({ code, mark: reprint, reason })
      .expect(200);
  /** The next revision with these meshes changed. */
  const next = async (
    meshes: { [fileName: string]: Buffer },
    marks: [string, string, string][],
    step: 'issue' | 'mark' = 'issue',
  ): Promise<RevisionDetail> => {
    const draft = await startRevision(maker, kitId, step);
    for (const [fileName, stl] of Object.entries(meshes)) await upload(maker, draft.id, fileName, stl);
    await writeNotes(maker, draft.id, { assemblyNotes: 'Push.', changeNotes: '### Changed\n\n- Fit.' });
    await shop.drain();
    for (const one of marks) await mark(draft, ...one);
    const revision = await release(shop, maker, draft.id);
    expect(revision.release).toMatchObject({ state: 'done', fault: null });
    made.push(revision);
    return revision;
  };

  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    ({ id: kitId, slug } = await draftKit(maker));
    await offerLicence(maker, kitId);
    const first = await next(
      {
        'J-01 Tongue.stl': boxStl(10, 20, 30),
        'H-01 Foot.stl': boxStl(60, 60, 12),
        'P-01 Pipe.stl': boxStl(20, 20, 90),
      },
      [],
    );
    await next({ 'J-01 Tongue.stl': boxStl(9.8, 20, 30), 'H-01 Foot.stl': boxStl(61, 60, 12) }, [
      ['J-01', 'reprint needed', 'It stuck.'],
      ['H-01', 'reprint if it troubles you', 'It rocked.'],
    ]);
    // The foot goes back to what it was.
    await next({ 'J-01 Tongue.stl': boxStl(9.7, 20, 30), 'H-01 Foot.stl': boxStl(60, 60, 12) }, [
      ['J-01', 'reprint if it troubles you', 'A little looser.'],
      ['H-01', 'reprint if it troubles you', 'As it was.'],
    ]);
    const person = await makePerson(shop, 'buyer');
    piaId = person.id;
    email = person.email;
    pia = shop.browser();
    await pia.post('/api/session').send({ email: person.email, passphrase: TEST_PASSPHRASE }).expect(200);
    await putOnShelf(shop, person, kitId, first.id);
  }, 60_000);
  afterAll(() => shop.stop());

  it('list net differences from the revision held: to the newest, or to one between', async () => {
    expect(await toPrint()).toEqual(['J-01 print 1+0']);
    const { list, sheet } = await plan();
    expect(list).toMatchObject({
      from: { basis: 'held', labels: ['Mk 1.0'] },
      to: { label: 'Mk 1.2' },
      breaks: null,
    });
    expect(list.parts.find(({ code }) => code === 'J-01')).toMatchObject({
      mark: 'reprint needed',
      steps: [
        { revision: 'Mk 1.2', reason: 'A little looser.' },
        { revision: 'Mk 1.1', reason: 'It stuck.' },
      ],
      whatDiffers: expect.stringMatching(/^−0\.30 mm width/),
    });
    expect(sheet.parts).toMatchObject([
      { code: 'J-01', heightMm: 30, variants: [], profile: { version: 1 } },
    ]);
    expect(await toPrint(made[1])).toEqual(['H-01 if-it-troubles 0+1', 'J-01 print 1+0']);
    await pia.get(`/api/shelf/${slug}/reprint`).query({ revision: newId() }).expect(404);
  });

  it('are kept part by part, and go before the revision held', async () => {
    const start: Record = (await pia.get(`/api/shelf/${slug}/printed`).expect(200)).body;
    expect(start).toMatchObject({ revision: { label: 'Mk 1.0' }, isKept: false });
    expect(printed(start)).toEqual(['H-01 1/1', 'J-01 1/1', 'P-01 1/1']);

    expect(printed(await say(made[2]!, 'J-01', 1))).toEqual(['H-01 1/1', 'J-01 1/1', 'P-01 1/1']);
    expect(await toPrint()).toEqual([]);
    expect((await plan()).list.from).toEqual({ basis: 'print-record', labels: ['Mk 1.2', 'Mk 1.0'] });

    // Taken back, a part is to print whatever was held; said of another revision of the same shape, it counts here.
    expect(printed(await say(made[0]!, 'P-01', 0))).toContain('P-01 0/1');
    expect(await toPrint()).toEqual(['P-01 print 1+0']);
    expect(printed(await say(made[2]!, 'P-01', 1))).toContain('P-01 1/1');
    expect(await toPrint()).toEqual([]);
    await pia
      .put(`/api/shelf/${slug}/printed`)
      .send({ revisionId: made[0]!.id, code: 'X-99', quantity: 1 })
      .expect(404)
      .expect(({ body }) => expect(body.detail).toBe('Mk 1.0 has no part X-99.'));

    await pia.delete(`/api/shelf/${slug}/printed`).expect(204);
    expect(await toPrint()).toEqual(['J-01 print 1+0']);
  });

  it('are filled by saying that all of a revision is printed', async () => {
    const { body } = await pia.post(`/api/shelf/${slug}/held`).send({ revisionId: made[1]!.id }).expect(200);
    expect(body).toMatchObject({ held: { label: 'Mk 1.1' }, reprint: { from: { basis: 'print-record' } } });
    const record: Record = (await pia.get(`/api/shelf/${slug}/printed`).expect(200)).body;
    expect(record).toMatchObject({ revision: { label: 'Mk 1.1' }, isKept: true });
    expect(await toPrint()).toEqual(['H-01 if-it-troubles 0+1', 'J-01 if-it-troubles 0+1']);
    await pia.post(`/api/shelf/${slug}/held`).send({ revisionId: made[0]!.id }).expect(200);
  });

  it('come for many readers at once, for each the list they would see', async () => {
    const readers = [
      { personId: piaId, email: '' },
      { personId: null, email: 'nobody@example.org' },
    ];
    const told: string[][] = [];
    for await (const { list } of shop.app.get(ReprintLists).listsFor(kitId, made[2]!.id, readers))
      told.push(list.parts.filter(({ advice }) => advice).map(({ code, print }) => `${code} ${print}`));
    expect(told).toEqual([['J-01 1'], ['H-01 1', 'J-01 1', 'P-01 1']]);
  });

  it('come as a bundle of their own, made once for all who need the same', async () => {
    const at = `/api/shelf/${slug}/changed-parts`;
    expect((await pia.get(at).expect(200)).body).toMatchObject({ state: 'not-asked', parts: 1, file: null });
    expect((await pia.post(at).send({}).expect(202)).body).toMatchObject({ state: 'waiting', parts: 1 });
    await shop.drain();
    const ready = (await pia.get(at).expect(200)).body;
    expect(ready).toMatchObject({ state: 'ready', percent: 100 });

    const given = await pia
      .post('/api/shelf/grants')
      .send({ kitSlug: slug, revisionId: made[2]!.id, file: ready.file.sha256 })
      .expect(201);
    expect(given.body.fileName).toBe(`${slug}-mk-1.2-changed-parts.zip`);
    const got = await pia
      .get(given.body.url)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
    expect(
      createHash('sha256')
        .update(got.body as Buffer)
        .digest('hex'),
    ).toBe(ready.file.sha256);
    const names = namesOf(got.body as Buffer);
    expect(names.filter((name) => name.startsWith('parts/'))).toEqual(['parts/J-01 Tongue.stl']);
    expect(names).toEqual(expect.arrayContaining(['SHA256SUMS', 'change-notes.md', 'reprint-list.md']));
    await pia.get(given.body.url).set('Range', 'bytes=0-9').expect(206);
    // Fetching it says nothing of what is held: the person does, once it is printed.
    expect((await pia.get(`/api/shelf/${slug}`).expect(200)).body.held.label).toBe('Mk 1.0');

    const other = await makePerson(shop, 'buyer');
    await putOnShelf(shop, other, kitId, made[0]!.id);
    const browser = shop.browser();
    await browser.post('/api/session').send({ email: other.email, passphrase: TEST_PASSPHRASE }).expect(200);
    expect((await browser.post(at).send({}).expect(202)).body.file).toEqual(ready.file);
    const stored = await shop.app.get(Storage).head(keyOf('bundles', ready.file.sha256));
    expect(stored).toEqual({ bytes: ready.file.bytes });
    await browser.post(at).send({ revisionId: made[0]!.id }).expect(409);

    // Nobody has asked for a month: it goes; asked for again, it comes out the same.
    const collector = shop.app.get(CollectChangedBundles);
    expect(await collector.collect()).toBe(0);
    await touchRows(shop.database, 'UPDATE changed_bundles SET used_at = :longAgo', {
      longAgo: shop.clock.in(-31 * 86_400),
    });
    expect(await collector.collect()).toBe(1);
    expect(await shop.app.get(Storage).head(keyOf('bundles', ready.file.sha256))).toBeNull();
    await browser.post(at).send({}).expect(202);
    await shop.drain();
    expect((await browser.get(at).expect(200)).body.file).toEqual(ready.file);
  });

  it('follow the habit of the printer: the gauge is answered, and the shelf says where it knows from', async () => {
    const printerCard = {
      name: 'Attic printer',
      bed: { xMm: 200, yMm: 200, zMm: 200 },
      nozzleMm: 0.4,
      materials: [{ material: 'PLA', pricePerKgMinor: null }],
      clearance: 'plus',
      isMain: true,
    };
    await pia.post('/api/account/printers').send(printerCard).expect(201);
    const { body } = await pia.get(`/api/shelf/${slug}`).expect(200);
    expect(body.clearance).toMatchObject({
      chosen: 'plus',
      said: null,
      habit: { clearance: 'plus', printer: 'Attic printer' },
    });
  });

  it('count every part as to print for another mark, and say so', async () => {
    const second = await next({}, [], 'mark');
    expect(second.label).toBe('Mk 2.0');
    const { list } = await plan();
    expect(list.breaks).toEqual({ from: ['Mk 1'], to: 'Mk 2' });
    expect(await toPrint()).toEqual(['H-01 print 1+0', 'J-01 print 1+0', 'P-01 print 1+0']);
  });

  it('rest when a revision is withdrawn: the shop falls back, holders hear of it once, nobody fetches it', async () => {
    const second = made[3]!;
    const at = `/api/workshop/revisions/${second.id}/withdrawal`;
    await pia.post(`/api/shelf/${slug}/held`).send({ revisionId: second.id }).expect(200);
    await touchRows(shop.database, 'UPDATE kits SET is_listed = TRUE WHERE id = :kitId', { kitId });
    const newest = async () => (await shop.browser().get(`/api/kits/${slug}`).expect(200)).body.revision;
    expect(await newest()).toBe('Mk 2.0');
    expect((await maker.get(at).expect(200)).body).toEqual({ holders: 1, fallsBackTo: 'Mk 1.2' });
    const given = (
      await pia.post('/api/shelf/grants').send({ kitSlug: slug, revisionId: second.id }).expect(201)
    ).body;

    await maker.post(at).send({ reason: 'No.' }).expect(422);
    const reason = 'The foot breaks when the bellows are full.';
    const { body } = await maker.post(at).send({ reason }).expect(200);
    expect(body).toMatchObject({ state: 'withdrawn', withdrawn: { reason } });
    await maker
      .post(at)
      .send({ reason })
      .expect(409)
      .expect(({ body: problem }) => expect(problem.detail).toBe('Mk 2.0 was withdrawn already.'));
    await shop.drain();

    expect(await newest()).toBe('Mk 1.2');
    const refused = await pia
      .post('/api/shelf/grants')
      .send({ kitSlug: slug, revisionId: second.id })
      .expect(403);
    expect(refused.body.detail).toBe(`The workshop has withdrawn Mk 2.0: ${reason}`);
    await pia.get(given.url).expect(403);
    const shelf = (await pia.get(`/api/shelf/${slug}`).expect(200)).body;
    expect(shelf).toMatchObject({
      held: { label: 'Mk 2.0', isWithdrawn: true, withdrawnReason: reason },
      newest: { label: 'Mk 1.2', isWithdrawn: false },
      reprint: { to: { label: 'Mk 1.2' }, breaks: { from: ['Mk 2'], to: 'Mk 1' } },
    });
    // The job may run again: each address has its one mail.
    await shop.app.get(Withdrawals).handle({ revisionId: second.id });
    const mails = await selectRows<{ to_address: string; message: string }>(
      shop.database,
      `SELECT to_address, message FROM mails WHERE template = 'revision-withdrawn'`,
    );
    expect(mails.map(({ to_address }) => to_address)).toEqual([email]);
    const log = await selectRows<{ subject: string }>(
      shop.database,
      `SELECT subject FROM staff_log WHERE what = 'withdrew a revision'`,
    );
    expect(log).toEqual([{ subject: 'Curlew Mk 2.0' }]);
  });

  it('leave the shop where no revision stands, and stay on the shelf with the reason', async () => {
    for (const revision of made.slice(0, 3).toReversed())
      await maker
        .post(`/api/workshop/revisions/${revision.id}/withdrawal`)
        .send({ reason: 'The whole kit is taken back.' })
        .expect(200);
    await shop.browser().get(`/api/kits/${slug}`).expect(404);
    expect((await pia.get(`/api/shelf/${slug}`).expect(200)).body.newest).toMatchObject({
      isWithdrawn: true,
      withdrawnReason: expect.any(String),
    });
    await (
      await signInAs(shop, 'helper')
    )
      .get(`/api/workshop/revisions/${made[0]!.id}/withdrawal`)
      .expect(403);
  });

  it('are nobody else’s to see', async () => {
    const stranger = await signInAs(shop, 'buyer');
    await stranger.get(`/api/shelf/${slug}/reprint`).expect(404);
    await stranger.get(`/api/shelf/${slug}/printed`).expect(404);
    await stranger.delete(`/api/shelf/${slug}/printed`).expect(404);
    expect(
      await touchRows(shop.database, 'DELETE FROM print_records WHERE person_id <> :piaId', { piaId }),
    ).toBe(0);
  });
});
