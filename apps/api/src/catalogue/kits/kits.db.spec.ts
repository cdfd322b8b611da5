import type { KitPage, Page } from '@windchest/contracts';
import { signInAs } from '../../testing/sign-in.js';
import { boxStl, draftKit, offerLicence, releasedKit, startRevision, upload } from '../../testing/maker.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';
import { PageHeads } from '../../http/page-heads.js';
import { CatalogueReader } from '../catalogue-reader.js';

describe('kits', () => {
  let shop: TestApp;
  let maker: Browser;
  let visitor: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    visitor = shop.browser();
  });
  afterAll(() => shop.stop());

  it('are in the shop only with a listing, a released revision and an offered licence', async () => {
    const draft = await draftKit(maker, 'Half done');
    await offerLicence(maker, draft.id);
    await maker.patch(`/api/workshop/kits/${draft.id}`).send({ isListed: true }).expect(200);
    await visitor.get(`/api/kits/${draft.slug}`).expect(404);

    const { kit } = await releasedKit(shop, maker, 'Wader');
    const page = (await visitor.get(`/api/kits/${kit.slug}`).expect(200)).body as KitPage;
    expect(page).toMatchObject({
      name: 'Wader',
      revision: 'Mk 1.0',
      partCount: 2,
      tallestPartMm: 40,
      longestPartMm: 60,
      price: { minor: 2400, currency: 'EUR' },
      compass: '',
    });
    expect(page.licences.map((licence) => licence.name)).toEqual(['Personal prints']);

    await maker.patch(`/api/workshop/kits/${kit.id}`).send({ isListed: false }).expect(200);
    await visitor.get(`/api/kits/${kit.slug}`).expect(404);
    await maker.patch(`/api/workshop/kits/${kit.id}`).send({ isListed: true }).expect(200);
    const licence = kit.licences[0]!;
    await maker
      .put(`/api/workshop/kits/${kit.id}/licences/${licence.id}`)
      .send({ ...licence, priceMinor: 2400, isOffered: false })
      .expect(200);
    await visitor.get(`/api/kits/${kit.slug}`).expect(404);
    const listed = (await visitor.get('/api/kits?size=100').expect(200)).body as Page<KitPage>;
    expect(listed.items.map((one) => one.slug)).not.toContain(kit.slug);
    expect(await shop.app.get(CatalogueReader).offeredLicences([licence.id])).toEqual([]);
  });

  it('are sorted and paged on the server', async () => {
    const names = ['Alpha', 'Beta', 'Gamma'];
    for (const [at, name] of names.entries()) {
      const { kit } = await releasedKit(shop, maker, `Row ${name}`);
      const licence = kit.licences[0]!;
      await maker
        .put(`/api/workshop/kits/${kit.id}/licences/${licence.id}`)
        .send({ ...licence, priceMinor: 3000 - at * 1000 })
        .expect(200);
    }
    const list = async (query: string): Promise<Page<KitPage>> =>
      (await visitor.get(`/api/kits?search=Row&${query}`).expect(200)).body as Page<KitPage>;
    const namesOf = (page: Page<KitPage>): string[] => page.items.map((one) => one.name);
    expect(namesOf(await list('sort=name'))).toEqual(['Row Alpha', 'Row Beta', 'Row Gamma']);
    expect(namesOf(await list('sort=price'))).toEqual(['Row Gamma', 'Row Beta', 'Row Alpha']);
    expect(namesOf(await list('sort=newest'))).toEqual(['Row Gamma', 'Row Beta', 'Row Alpha']);
    const second = await list('sort=name&size=2&page=2');
    expect(namesOf(second)).toEqual(['Row Gamma']);
    expect(second.total).toBe(3);
  });

  it('show their compass and rank from the voices of the newest revision, lowest first', async () => {
    const { id } = await draftKit(maker, 'Rank');
    await offerLicence(maker, id);
    const draft = await startRevision(maker, id);
    const voices = [
      { code: 'P-08', note: 'E5', lengthMm: 124 },
      { code: 'P-09', note: 'C5', lengthMm: 158 },
    ];
    for (const { code, note, lengthMm } of voices) {
      const { partId } = await upload(maker, draft.id, `${code}.stl`, boxStl(16, 16, lengthMm));
      await maker
        .put(`/api/workshop/revisions/${draft.id}/parts/${partId}`)
        .send({
          code,
          name: note,
          quantity: 1,
          orientation: 'may-lie',
          printSpec: null,
          voice: { kind: 'stopped-pipe', note, lengthMm, boreMm: 12, wallMm: 2 },
        })
        .expect(200);
    }
    await maker
      .patch(`/api/workshop/revisions/${draft.id}`)
      .send({ assemblyNotes: 'Cork them.', declaredCents: 100 })
      .expect(200);
    await maker.patch(`/api/workshop/kits/${id}`).send({ isListed: true }).expect(200);
    await shop.drain();
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(202);
    await shop.drain();
    const kit = await shop.app.get(CatalogueReader).kitsByIds([id]);
    const page = (await visitor.get(`/api/kits/${kit[0]!.slug}`).expect(200)).body as KitPage;
    expect(page.compass).toBe('C5–E5');
    expect(page.rank.map(({ voice }) => voice.note)).toEqual(['C5', 'E5']);
    const voicing = await shop.app.get(CatalogueReader).voicingOf(draft.id);
    expect(voicing).toEqual({ rank: page.rank, room: page.room, declaredCents: 100 });
    const { body: parts } = await visitor.get(`/api/kits/${kit[0]!.slug}/parts`).expect(200);
    expect(parts[0]).toMatchObject({ sizeMm: { x: 16, y: 16 }, areaMm2: expect.any(Number) });
    expect(parts[0].drawing.path).toMatch(/^M/);
  });

  it('keep their addresses apart', async () => {
    const kit = await draftKit(maker, 'Twin');
    const { body } = await maker
      .post('/api/workshop/kits')
      .send({ name: 'Other', slug: kit.slug, tagline: '', description: '', colour: 'moss' })
      .expect(409);
    expect(body).toMatchObject({ code: 'already-exists', fields: { slug: expect.any(String) } });
  });

  it('give shared links a title, a price and structured data that cannot break out of its element', async () => {
    const { kit } = await releasedKit(shop, maker, 'Reed');
    await maker
      .patch(`/api/workshop/kits/${kit.id}`)
      .send({ name: 'A </script><script>alert(1)</script> "kit"', tagline: '<b>loud</b>' })
      .expect(200);
    const head = await shop.app.get(PageHeads).headFor(`/kits/${kit.slug}`);
    expect(head.match(/<script/g)).toHaveLength(1);
    const json = /<script type="application\/ld\+json">(.*)<\/script>/.exec(head)![1]!;
    expect(JSON.parse(json)).toMatchObject({
      '@type': 'Product',
      name: 'A </script><script>alert(1)</script> "kit"',
      offers: { price: '24.00', priceCurrency: 'EUR' },
    });
    expect(head).toContain('content="&lt;b&gt;loud&lt;/b&gt;"');
    expect(await shop.app.get(PageHeads).headFor('/kits/not-there')).not.toContain('Product');
  });

  it('tell other rooms what is on sale and nothing of drafts', async () => {
    const { kit, revision } = await releasedKit(shop, maker, 'Sold');
    const next = await startRevision(maker, kit.id);
    const reader = shop.app.get(CatalogueReader);
    expect(await reader.offeredLicences([kit.licences[0]!.id])).toEqual([
      {
        licenceId: kit.licences[0]!.id,
        licenceName: 'Personal prints',
        licenceKind: 'personal',
        terms: 'Print it for yourself as often as you like.',
        priceMinor: 2400,
        kitId: kit.id,
        kitSlug: kit.slug,
        kitName: 'Sold',
        colour: 'teal',
        revisionId: revision.id,
        revisionLabel: 'Mk 1.0',
      },
    ]);
    expect(await reader.revisionsOf(kit.id)).toMatchObject([
      { id: revision.id, label: 'Mk 1.0', isWithdrawn: false },
    ]);
    expect(await reader.revisionById(next.id)).toBeNull();
    expect(await reader.bundleFile(next.id)).toBeNull();
    expect(await reader.documentsOf(next.id)).toEqual([]);
    expect(await reader.bundleFile(revision.id)).toMatchObject({
      fileName: `${kit.slug}-mk-1.0.zip`,
      contentType: 'application/zip',
      sha256: revision.bundle!.sha256,
      bytes: revision.bundle!.bytes,
    });
    const part = revision.parts[0]!.file!;
    expect(await reader.fileOf(revision.id, part.sha256)).toMatchObject({ fileName: part.fileName });
    expect(await reader.fileOf(revision.id, '0'.repeat(64))).toBeNull();
    expect((await reader.documentsOf(revision.id)).map((one) => one.fileName)).toEqual(['Tuning table.md']);
  });

  it('write every change of staff into the log', async () => {
    const owner = await signInAs(shop, 'owner');
    const kit = await draftKit(maker, 'Logged');
    await maker.patch(`/api/workshop/kits/${kit.id}`).send({ tagline: 'New words' }).expect(200);
    const { body } = await owner.get('/api/workshop/log?search=Logged').expect(200);
    expect(body.items.map((one: { what: string }) => one.what)).toEqual(['changed a kit', 'drafted a kit']);
    expect(body.items[0]).toMatchObject({
      before: { tagline: 'A set of stopped pipes' },
      after: { tagline: 'New words' },
    });
  });
});
