import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { endpoints, type EndpointKey } from '@windchest/contracts';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { ENDPOINT, type EndpointMetadata } from './endpoint.js';

describe('the routes', () => {
  let shop: TestApp;
  beforeAll(async () => (shop = await startTestApp()));
  afterAll(() => shop.stop());

  const handlers = (): { name: string; metadata: EndpointMetadata | undefined; isRoute: boolean }[] => {
    const scanner = new MetadataScanner();
    return shop.app
      .get(DiscoveryService, { strict: false })
      .getControllers()
      .flatMap(({ instance, name }) =>
        scanner.getAllMethodNames(Object.getPrototypeOf(instance) as object).map((method) => {
          const handler = (instance as Record<string, object>)[method] as object;
          return {
            name: `${name}.${method}`,
            metadata: Reflect.getMetadata(ENDPOINT, handler) as EndpointMetadata | undefined,
            isRoute: Reflect.hasMetadata('path', handler),
          };
        }),
      );
  };

  it('all declare who may call them', () => {
    const routes = handlers().filter((one) => one.isRoute);
    expect(routes.length).toBeGreaterThan(2);
    expect(routes.filter((one) => !one.metadata?.access).map((one) => one.name)).toEqual([]);
  });

  it('are those of the contract, each served once', () => {
    const served = handlers().flatMap((one) => (one.metadata ? [one.metadata.key] : []));
    expect([...served].sort()).toEqual((Object.keys(endpoints) as EndpointKey[]).sort());
  });

  it('are described as OpenAPI 3.1 from the same contract', async () => {
    const { body } = await shop.browser().get('/api/docs/openapi.json').expect(200);
    expect(body.openapi).toBe('3.1.0');
    const described = Object.entries(body.paths as Record<string, object>).flatMap(([path, methods]) =>
      Object.keys(methods).map(
        (method) => `${method.toUpperCase()} ${path.replace('/api', '').replace(/\{(\w+)\}/g, ':$1')}`,
      ),
    );
    expect(described.sort()).toEqual(Object.keys(endpoints).sort());
  });

  it('refuse what changes something without the header of the shop or from another site', async () => {
    const bare = await shop.browser().delete('/api/session').unset('X-Windchest').expect(403);
    expect(bare.body.code).toBe('cross-site-refused');
    const foreign = await shop
      .browser()
      .delete('/api/session')
      .set('Origin', 'https://elsewhere.example')
      .expect(403);
    expect(foreign.headers['content-type']).toContain('application/problem+json');
    await shop.browser().delete('/api/session').set('Sec-Fetch-Site', 'cross-site').expect(403);
  });

  it('answer unknown addresses with a problem that carries the request id', async () => {
    const answer = await shop
      .browser()
      .get('/api/nothing-here')
      .set('X-Request-Id', 'request-12345678')
      .expect(404);
    expect(answer.body).toMatchObject({ code: 'not-found', status: 404, requestId: 'request-12345678' });
    expect(answer.headers['x-request-id']).toBe('request-12345678');
  });

  it('send strict security headers', async () => {
    const { headers } = await shop.browser().get('/api/health/live').expect(200);
    expect(headers['content-security-policy']).toContain("script-src 'self'");
    expect(headers['content-security-policy']).not.toMatch(/'unsafe-(inline|eval)'/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  });
});
