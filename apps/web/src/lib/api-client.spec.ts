import { ApiFault } from './api-fault.js';
import { call, keyOf } from './api-client.js';
import { isAnswerOf } from './use-action.js';

interface Sent {
  address: string;
  init: RequestInit;
}

function answering(answer: () => Response | Promise<Response>): Sent[] {
  const sent: Sent[] = [];
  globalThis.fetch = (async (address: string, init: RequestInit) => {
    sent.push({ address, init });
    return answer();
  }) as typeof fetch;
  return sent;
}

const json = (body: unknown, init: ResponseInit = {}, type = 'application/json') =>
  new Response(JSON.stringify(body), { ...init, headers: { 'content-type': type, ...init.headers } });

const realFetch = globalThis.fetch;
afterAll(() => {
  globalThis.fetch = realFetch;
});

describe('call', () => {
  it('puts params and query into the address, below /api', async () => {
    const sent = answering(() => json({ items: [] }));
    await call('GET /kits', { query: { page: 2, search: 'pan flute', size: undefined } });
    await call('GET /kits/:slug', { params: { slug: 'a/b' } });
    expect(sent.map((one) => one.address)).toEqual(['/api/kits?page=2&search=pan+flute', '/api/kits/a%2Fb']);
  });

  it('sends the shop’s own header with what changes something, and not with what only reads', async () => {
    const sent = answering(() => json({}));
    await call('GET /session');
    await call('POST /session', { body: { email: 'wren@example.org', passphrase: 'a short sentence' } });
    expect(sent[0]?.init.headers).not.toHaveProperty('X-Windchest');
    expect(sent[1]?.init.headers).toMatchObject({ 'X-Windchest': '1', 'Content-Type': 'application/json' });
    expect(sent[1]?.init.body).toBe('{"email":"wren@example.org","passphrase":"a short sentence"}');
  });

  it('answers nothing where the API answers without a body', async () => {
    answering(() => new Response(null, { status: 204 }));
    await expect(call('DELETE /session')).resolves.toBeUndefined();
  });

  it('throws what a problem body says', async () => {
    const problem = {
      type: 'about:blank',
      title: 'The code is used up',
      status: 409,
      code: 'coupon-is-used-up',
      detail: 'All 150 places are taken.',
      requestId: 'r-1',
      fields: { couponCode: 'All 150 places are taken.' },
    };
    answering(() => json(problem, { status: 409 }, 'application/problem+json'));
    const fault = await call('GET /session').catch((thrown: unknown) => thrown);
    expect(fault).toBeInstanceOf(ApiFault);
    expect(fault).toMatchObject({
      status: 409,
      code: 'coupon-is-used-up',
      detail: 'All 150 places are taken.',
      requestId: 'r-1',
      fields: { couponCode: 'All 150 places are taken.' },
    });
  });

  it('throws a fault of its own for an answer that comes from something in front of the API', async () => {
    answering(
      () => new Response('<h1>Bad gateway</h1>', { status: 502, headers: { 'content-type': 'text/html' } }),
    );
    await expect(call('GET /session')).rejects.toMatchObject({ status: 502, code: 'internal' });
  });

  it('says that the workshop cannot be reached where the connection breaks', async () => {
    answering(() => Promise.reject(new TypeError('Failed to fetch')));
    await expect(call('GET /session')).rejects.toMatchObject({ status: 0, code: 'unreachable' });
  });
});

describe('keyOf', () => {
  it('makes keys that revalidation finds by their endpoint, whatever the input', () => {
    const isStale = isAnswerOf(['GET /kits', 'GET /shelf']);
    expect(isStale(keyOf('GET /kits', { query: { page: 3 } }))).toBe(true);
    expect(isStale(keyOf('GET /kits/:slug', { params: { slug: 'curlew' } }))).toBe(false);
    expect(isStale('GET /kits')).toBe(false);
  });
});
