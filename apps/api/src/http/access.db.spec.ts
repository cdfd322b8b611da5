import {
  endpoints,
  isStaff,
  may,
  roles,
  type Access,
  type EndpointKey,
  type Role,
} from '@windchest/contracts';
import { signInAs } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

const nobody = '00000000-0000-7000-8000-000000000000';
const addressOf = (key: EndpointKey): { method: string; path: string } => {
  const [method, path] = key.split(' ') as [string, string];
  return { method: method.toLowerCase(), path: `/api${path.replace(/:\w+/g, nobody)}` };
};

describe('the permission table, at every route and for every role', () => {
  let shop: TestApp;
  const browsers = new Map<Role | 'visitor', Browser>();
  beforeAll(async () => {
    shop = await startTestApp();
    browsers.set('visitor', shop.browser());
    for (const role of roles) browsers.set(role, await signInAs(shop, role));
  });
  afterAll(() => shop.stop());

  const guarded = (Object.keys(endpoints) as EndpointKey[])
    .filter((key) => endpoints[key].access !== 'public' && key !== 'DELETE /account/sessions')
    .map((key) => [key, endpoints[key].access as Access] as const);

  it.each(guarded)('%s needs %s', async (key, access) => {
    const { method, path } = addressOf(key);
    for (const [who, browser] of browsers) {
      const answer = await (
        browser as unknown as Record<string, (path: string) => Promise<{ status: number }>>
      )[method]!(path);
      if (who === 'visitor') expect([who, answer.status]).toEqual([who, 401]);
      else if (access === 'signed-in' || may(who, access as never))
        expect([who, [401, 403].includes(answer.status)]).toEqual([who, false]);
      else expect([who, answer.status]).toEqual([who, 403]);
    }
  });

  it('keeps the whole workshop from buyers', () => {
    const workshop = guarded.filter(([key]) => key.includes('/workshop/'));
    expect(workshop.length).toBeGreaterThan(10);
    for (const [, access] of workshop) expect(may('buyer', access as never)).toBe(false);
    expect(isStaff('buyer')).toBe(false);
  });
});
