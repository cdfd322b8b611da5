import type { KitCard, Page, PrinterCard, PrinterCardFields, PrintSheet } from '@windchest/contracts';
import { fitPart } from '@windchest/plates';
import { PrinterCards } from '../../accounts/printers/printer-cards.js';
import {
  boxStl,
  draftKit,
  offerLicence,
  release,
  startRevision,
  upload,
  writeNotes,
} from '../../testing/maker.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';

const card = (name: string): PrinterCardFields => ({
  name,
  bed: { xMm: 220, yMm: 220.5, zMm: 250 },
  nozzleMm: 0.4,
  materials: [
    { material: 'PETG', pricePerKgMinor: 2350 },
    { material: 'Reed fibre', pricePerKgMinor: null },
  ],
  clearance: null,
});

describe('will it print', () => {
  let shop: TestApp;
  beforeAll(async () => (shop = await startTestApp()));
  afterAll(() => shop.stop());

  describe('a printer card on the account', () => {
    const list = async (browser: Browser): Promise<PrinterCard[]> =>
      (await browser.get('/api/account/printers').expect(200)).body as PrinterCard[];
    const add = async (browser: Browser, name: string, isMain = false): Promise<PrinterCard> =>
      (
        await browser
          .post('/api/account/printers')
          .send({ ...card(name), isMain })
          .expect(201)
      ).body as PrinterCard;

    it('is kept as written; the first is the main one, and exactly one is at any time', async () => {
      const { id, email } = await makePerson(shop, 'buyer');
      const browser = shop.browser();
      await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
      const cards = shop.app.get(PrinterCards, { strict: false });
      expect(await cards.mainOf(id)).toBeNull();

      const first = await add(browser, 'Loft');
      expect(first).toEqual({ ...card('Loft'), id: first.id, isMain: true });
      const second = await add(browser, 'Cellar');
      const third = await add(browser, 'Shed', true);
      const mainsOf = (all: PrinterCard[]) => all.filter((one) => one.isMain).map((one) => one.name);
      expect((await list(browser)).map((one) => one.name)).toEqual(['Shed', 'Loft', 'Cellar']);
      expect(mainsOf(await list(browser))).toEqual(['Shed']);

      const change = (printer: PrinterCard, body: Partial<PrinterCard>) =>
        browser.put(`/api/account/printers/${printer.id}`).send({ ...printer, ...body });
      await change(second, { isMain: true, clearance: 'plus', nozzleMm: 0.6 }).expect(200);
      expect(mainsOf(await list(browser))).toEqual(['Cellar']);
      expect(await cards.mainOf(id)).toMatchObject({ name: 'Cellar', clearance: 'plus', nozzleMm: 0.6 });
      const { body } = await change(second, { isMain: false }).expect(422);
      expect(body.fields.isMain).toMatch(/Make another one the main printer/);

      await browser.delete(`/api/account/printers/${second.id}`).expect(204);
      expect(mainsOf(await list(browser))).toEqual(['Loft']);
      await browser.delete(`/api/account/printers/${third.id}`).expect(204);
      await browser.delete(`/api/account/printers/${first.id}`).expect(204);
      expect(await list(browser)).toEqual([]);
    });

    it('of somebody else is not there', async () => {
      const [mine, other] = [await signInAs(shop, 'buyer'), await signInAs(shop, 'owner')];
      const kept = await add(mine, 'Loft');
      const at = `/api/account/printers/${kept.id}`;
      await other
        .put(at)
        .send({ ...card('Taken'), isMain: true })
        .expect(404);
      await other.delete(at).expect(404);
      expect(await list(other)).toEqual([]);
      expect(await list(mine)).toEqual([kept]);
    });

    it('is refused past the twentieth, however many are sent at once', async () => {
      const browser = await signInAs(shop, 'buyer');
      const sent = Array.from({ length: 24 }, (_, at) =>
        browser.post('/api/account/printers').send({ ...card(`Row ${at}`), isMain: true }),
      );
      const answers = await Promise.all(sent);
      expect(answers.filter(({ status }) => status === 201)).toHaveLength(20);
      const refused = answers.filter(({ status }) => status !== 201);
      expect(refused.map(({ body }) => body.code)).toEqual(Array(4).fill('conflict'));
      const kept = await list(browser);
      expect(kept).toHaveLength(20);
      expect(kept.filter((one) => one.isMain)).toHaveLength(1);
    });

    it('says what is wrong with it, field by field', async () => {
      const browser = await signInAs(shop, 'buyer');
      const twice = [
        { material: 'PLA', pricePerKgMinor: null },
        { material: ' pla', pricePerKgMinor: 10 },
      ];
      const { body } = await browser
        .post('/api/account/printers')
        .send({ ...card(''), materials: twice, bed: { xMm: 0, yMm: 1, zMm: 1 }, isMain: false })
        .expect(422);
      expect(Object.keys(body.fields).sort()).toEqual(['bed.xMm', 'materials', 'name']);
      expect(body.fields.materials).toMatch(/stands here twice/);
    });
  });

  describe('a kit', () => {
    let visitor: Browser;
    const slugs: Record<string, string> = {};

    const releaseKit = async (
      maker: Browser,
      name: string,
      parts: { file: string; size: [number, number, number]; orientation: string }[],
    ): Promise<void> => {
      const kit = await draftKit(maker, name);
      await offerLicence(maker, kit.id);
      const draft = await startRevision(maker, kit.id);
      for (const { file, size, orientation } of parts) {
        const { partId } = await upload(maker, draft.id, file, boxStl(...size));
        const [code] = file.split(' ');
        await maker
          .put(`/api/workshop/revisions/${draft.id}/parts/${partId}`)
          .send({ code, name: file, quantity: 2, orientation, printSpec: null, voice: null })
          .expect(200);
      }
      await writeNotes(maker, draft.id, {
        assemblyNotes: 'Glue it.',
        buildVolume: { xMm: 400, yMm: 400, zMm: 400 },
      });
      await shop.drain();
      expect(await release(shop, maker, draft.id)).toMatchObject({ state: 'released' });
      await maker.patch(`/api/workshop/kits/${kit.id}`).send({ isListed: true }).expect(200);
      slugs[name] = kit.slug;
    };

    beforeAll(async () => {
      visitor = shop.browser();
      const maker = await signInAs(shop, 'maker');
      await releaseKit(maker, 'Fits small', [
        { file: 'A-01 Box.stl', size: [60, 50, 40], orientation: 'as-exported' },
      ]);
      await releaseKit(maker, 'Fits turned', [
        { file: 'B-01 Bar.stl', size: [125, 6, 5], orientation: 'may-turn' },
        { file: 'B-02 Deep.stl', size: [40, 99, 5], orientation: 'may-turn' },
      ]);
      await releaseKit(maker, 'Fits laid', [
        { file: 'C-01 Tower.stl', size: [20, 20, 95], orientation: 'may-lie' },
      ]);
      await releaseKit(maker, 'Fits never', [
        { file: 'D-01 Box.stl', size: [60, 50, 40], orientation: 'may-turn' },
        { file: 'D-02 Bar.stl', size: [125, 6, 5], orientation: 'as-exported' },
      ]);
    });

    it('shows its print sheet to everybody: outlines and profiles, and nothing a mesh could be made from', async () => {
      const at = `/api/kits/${slugs['Fits turned']}/print`;
      const answer = await visitor.get(at).expect(200);
      const sheet = answer.body as PrintSheet;
      expect(sheet).toMatchObject({ revision: 'Mk 1.0', unmeasured: [] });
      expect(sheet.parts.map(({ code, quantity }) => [code, quantity])).toEqual([
        ['B-01', 2],
        ['B-02', 2],
      ]);
      const [bar] = sheet.parts;
      expect(bar).toMatchObject({
        sizeMm: { x: 125, y: 6, z: 5 },
        heightMm: 5,
        orientation: 'may-turn',
        printSpec: null,
      });
      expect(bar?.footprint).toHaveLength(4);
      expect(bar?.profile?.volumeMm3).toBeCloseTo(125 * 6 * 5, 0);
      expect(Object.keys(bar ?? {}).sort()).toEqual(
        'code footprint heightMm isGauge name orientation printSpec profile quantity sizeMm variants'.split(
          ' ',
        ),
      );
      const tag = answer.headers['etag'] as string;
      expect((await visitor.get(at).set('If-None-Match', tag).expect(304)).text).toBe('');
      await visitor.get('/api/kits/no-such-kit/print').expect(404);
    });

    it('is listed for a printer where every part fits as its rule allows, page by page', async () => {
      const list = async (query: string): Promise<Page<KitCard>> =>
        (await visitor.get(`/api/kits?sort=name&${query}`).expect(200)).body as Page<KitCard>;
      const namesOf = ({ items }: Page<KitCard>) => items.map((one) => one.name);
      // The bar lies aslant on a bed of 100 × 100; the deep part and the tower only turned and laid.
      const bed = 'fitsX=100&fitsY=90&fitsZ=60';
      expect(
        fitPart({ sizeMm: [125, 6, 5], orientation: 'may-turn' }, { xMm: 100, yMm: 90, zMm: 60 }).fit,
      ).toBe('fits-turned');
      const all = await list(bed);
      expect(namesOf(all)).toEqual(['Fits laid', 'Fits small', 'Fits turned']);
      const second = await list(`${bed}&size=2&page=2`);
      expect(namesOf(second)).toEqual(['Fits turned']);
      expect([all.total, second.total]).toEqual([3, 3]);
      expect(namesOf(await list('fitsX=90&fitsY=100&fitsZ=60'))).toEqual(namesOf(all));
      expect(namesOf(await list('fitsX=126&fitsY=60&fitsZ=60'))).toEqual([
        'Fits laid',
        'Fits never',
        'Fits small',
        'Fits turned',
      ]);
      expect(namesOf(await list('fitsX=10&fitsY=10&fitsZ=10'))).toEqual([]);
      expect(namesOf(await list('search=small&fitsX=100&fitsY=90&fitsZ=60'))).toEqual(['Fits small']);
      await visitor.get('/api/kits?fitsX=100').expect(422);
    });

    it('with a part nobody has measured is promised to no printer', async () => {
      await shop.database.query(
        `UPDATE measurements SET measurement = NULL WHERE width_mm = 20 AND depth_mm = 20 AND height_mm = 95`,
      );
      const { body } = await visitor.get('/api/kits?fitsX=400&fitsY=400&fitsZ=400').expect(200);
      expect((body as Page<KitCard>).items.map((one) => one.name)).not.toContain('Fits laid');
      const sheet = (await visitor.get(`/api/kits/${slugs['Fits laid']}/print`).expect(200))
        .body as PrintSheet;
      expect([sheet.parts, sheet.unmeasured]).toEqual([[], ['C-01']]);
    });
  });
});
