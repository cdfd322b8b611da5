import { gzipSync } from 'node:zlib';
import { expect, test } from '@playwright/test';

const BUDGET_BYTES = 130_000;

test('the shop’s first load is at most 130 kB of JavaScript, and none of it is the workshop’s', async ({
  page,
}) => {
  const scripts = new Map<string, number>();
  page.on('response', async (response) => {
    if (/javascript/.test(response.headers()['content-type'] ?? ''))
      scripts.set(response.url(), gzipSync(await response.body()).length);
  });
  await page.goto('/', { waitUntil: 'networkidle' });
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  const total = [...scripts.values()].reduce((sum, bytes) => sum + bytes, 0);
  expect(scripts.size).toBeGreaterThan(0);
  expect(total).toBeLessThanOrEqual(BUDGET_BYTES);
  expect(
    [...scripts.keys()].filter((url) => /workshop|revision|markdown|form-resolver|three/.test(url)),
  ).toEqual([]);
});

test('assets are kept for a year, pages are asked for anew, and unknown assets are not answered with a page', async ({
  request,
}) => {
  const page = await request.get('/');
  expect(page.headers()['cache-control']).toBe('no-cache');
  const asset = /\/assets\/[^"]+\.js/.exec(await page.text())?.[0] ?? '';
  const answer = await request.get(asset);
  expect(answer.headers()['cache-control']).toContain('immutable');
  expect((await request.get('/assets/nothing-here.js')).status()).toBe(404);
  expect((await request.get('/api/nothing-here')).headers()['content-type']).toContain(
    'application/problem+json',
  );
  const kit = await (await request.get('/kits/curlew')).text();
  expect(kit).toContain('<title>Curlew');
  expect(kit).toContain('og:title');
});
