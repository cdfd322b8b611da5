import { putKitOnSale } from '../testing/kit-on-sale.js';
import { signInAs } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

/** One pixel (ISO/IEC 15948, from memory). */
const PNG = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);

describe('the journal', () => {
  let shop: TestApp;
  let maker: Browser;
  let helper: Browser;
  let visitor: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    helper = await signInAs(shop, 'helper');
    visitor = shop.browser();
  });
  afterAll(() => shop.stop());

  const draft = async (slug: string, more: object = {}): Promise<string> => {
    const words = {
      title: `Post ${slug}`,
      slug,
      lead: 'In short.',
      body: 'At length.',
      audience: 'everybody',
    };
    const { body } = await helper
      .post('/api/workshop/posts')
      .send({ ...words, kitId: null, ...more })
      .expect(201);
    return (body as { id: string }).id;
  };
  const publish = (id: string) => maker.post(`/api/workshop/posts/${id}/publication`).expect(200);

  it('shows nobody a draft, and everybody a post that the maker has published', async () => {
    const id = await draft('reeds-at-last');
    await visitor.get('/api/journal/reeds-at-last').expect(404);
    await helper.post(`/api/workshop/posts/${id}/publication`).expect(403);
    await publish(id);
    const { body } = await visitor.get('/api/journal/reeds-at-last').expect(200);
    expect(body).toMatchObject({ title: 'Post reeds-at-last', body: 'At length.', mayRead: true });
    const list = await visitor.get('/api/journal').expect(200);
    expect(list.body).toMatchObject({ total: 1, items: [{ slug: 'reeds-at-last' }] });
  });

  it('lets a helper change a draft, not what is out', async () => {
    const id = await draft('helping');
    const words = {
      title: 'Better',
      slug: 'helping',
      lead: '',
      body: 'x',
      audience: 'everybody',
      kitId: null,
    };
    await helper.put(`/api/workshop/posts/${id}`).send(words).expect(200);
    await publish(id);
    await helper.put(`/api/workshop/posts/${id}`).send(words).expect(403);
    await maker
      .put(`/api/workshop/posts/${id}`)
      .send({ ...words, title: 'Best' })
      .expect(200);
  });

  it('keeps from others what is for supporters, pictures and feed included', async () => {
    const id = await draft('next-kit', { audience: 'supporters', body: 'A secret kit.' });
    const sent = await helper
      .post(`/api/workshop/posts/${id}/pictures`)
      .attach('picture', PNG, 'bench.png')
      .expect(201);
    const address = `/api/journal/pictures/${(sent.body as { id: string }).id}`;
    await publish(id);
    const { body } = await visitor.get('/api/journal/next-kit').expect(200);
    expect(body).toMatchObject({ title: 'Post next-kit', lead: 'In short.', body: null, mayRead: false });
    await visitor.get(address).expect(404);
    await helper.get(address).expect(200).expect('Content-Type', 'image/png');
    const feed = await visitor.get('/api/journal.atom').expect(200);
    expect(feed.headers['content-type']).toMatch(/^application\/atom\+xml/);
    expect(feed.text).toContain('Post next-kit (for supporters)');
    expect(feed.text).not.toContain('A secret kit.');
  });

  it('refuses a picture that is none, by its name, and an address that is taken', async () => {
    const id = await draft('odd-picture');
    const refused = await helper
      .post(`/api/workshop/posts/${id}/pictures`)
      .attach('picture', Buffer.from('<svg/>'), 'bench.png')
      .expect(422);
    expect((refused.body as { detail: string }).detail).toMatch(/^“bench.png” is no PNG, JPEG or WebP/);
    const again = await helper
      .post('/api/workshop/posts')
      .send({ title: 'A', slug: 'odd-picture', lead: '', body: '', audience: 'everybody', kitId: null })
      .expect(409);
    expect(again.body).toMatchObject({ fields: { slug: 'This address is taken.' } });
    await maker.post(`/api/workshop/posts/${await draft('empty', { body: ' ' })}/publication`).expect(422);
  });

  it('keeps a post’s first date when it is taken back and published again', async () => {
    const id = await draft('twice');
    await publish(id);
    const first = (await visitor.get('/api/journal/twice').expect(200)).body as { publishedAt: string };
    await maker.delete(`/api/workshop/posts/${id}/publication`).expect(200);
    await visitor.get('/api/journal/twice').expect(404);
    shop.clock.advance(3600);
    await publish(id);
    expect((await visitor.get('/api/journal/twice').expect(200)).body).toMatchObject({
      publishedAt: first.publishedAt,
    });
    await maker.delete(`/api/workshop/posts/${id}`).expect(204);
    await visitor.get('/api/journal/twice').expect(404);
  });

  it('tells of a kit’s revisions in a feed of its own', async () => {
    const kit = await putKitOnSale(shop, { name: 'Curlew' });
    const feed = await visitor.get(`/api/kits/${kit.slug}/revisions.atom`).expect(200);
    expect(feed.text).toContain(`<id>urn:uuid:${kit.revisionId}</id>`);
    expect(feed.text).toContain('<title>Curlew Mk 1.4</title>');
    await visitor.get('/api/kits/no-such-kit/revisions.atom').expect(404);
  });
});
