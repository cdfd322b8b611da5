import { roles, type Role } from '@windchest/contracts';
import { draftKit, releasedKit, sendFile, startRevision } from '../testing/maker.js';
import { signInAs } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

type Who = Role | 'visitor';
const everybody: Who[] = ['visitor', ...roles];

describe('who may do what in the catalogue', () => {
  let shop: TestApp;
  let kitId: string;
  let slug: string;
  let draftId: string;
  const browsers = new Map<Who, Browser>();
  beforeAll(async () => {
    shop = await startTestApp();
    browsers.set('visitor', shop.browser());
    for (const role of roles) browsers.set(role, await signInAs(shop, role));
    const maker = browsers.get('maker')!;
    ({ slug } = (await releasedKit(shop, maker)).kit);
    kitId = (await draftKit(maker)).id;
    draftId = (await startRevision(maker, kitId)).id;
  });
  afterAll(() => shop.stop());

  const statuses = async (
    call: (browser: Browser) => PromiseLike<{ status: number }>,
  ): Promise<Record<Who, number>> =>
    Object.fromEntries(
      await Promise.all(
        everybody.map(async (who) => [who, (await call(browsers.get(who)!)).status] as const),
      ),
    ) as Record<Who, number>;

  it('everybody sees kits in the shop', async () => {
    for (const path of ['/api/kits', `/api/kits/${slug}`, `/api/kits/${slug}/parts`])
      expect(new Set(Object.values(await statuses((one) => one.get(path))))).toEqual(new Set([200]));
  });

  it('all staff see the workshop’s kits and drafts, nobody else does', async () => {
    for (const path of [
      '/api/workshop/kits',
      `/api/workshop/kits/${kitId}`,
      `/api/workshop/revisions/${draftId}`,
      `/api/workshop/revisions/${draftId}/comparison`,
    ])
      expect(await statuses((one) => one.get(path))).toEqual({
        visitor: 401,
        buyer: 403,
        helper: 200,
        bookkeeper: 200,
        maker: 200,
        owner: 200,
      });
  });

  const onlyMakers = (done: number): Record<Who, number> => ({
    visitor: 401,
    buyer: 403,
    helper: 403,
    bookkeeper: 403,
    maker: done,
    owner: done,
  });

  it('only maker and owner write kits, prices and revisions, and release', async () => {
    expect(await statuses((one) => one.patch(`/api/workshop/kits/${kitId}`).send({ tagline: 'x' }))).toEqual(
      onlyMakers(200),
    );
    const licence = {
      kind: 'classroom',
      name: 'Class',
      terms: 'Thirty.',
      priceMinor: 100,
      yearlyLimit: null,
    };
    expect(await statuses((one) => one.post(`/api/workshop/kits/${kitId}/licences`).send(licence))).toEqual(
      onlyMakers(201),
    );
    expect(
      await statuses((one) => one.patch(`/api/workshop/revisions/${draftId}`).send({ cautions: 'Hot.' })),
    ).toEqual(onlyMakers(200));
    expect(await statuses((one) => sendFile(one, draftId, 'x.md', 'words'))).toEqual(onlyMakers(201));
    expect(await statuses((one) => one.post(`/api/workshop/revisions/${draftId}/release`))).toEqual(
      onlyMakers(409),
    );
    expect(
      await statuses((one) => one.post(`/api/workshop/kits/${kitId}/revisions`).send({ step: 'issue' })),
    ).toEqual(onlyMakers(409));
  });
});
