import { expect, type Page } from '@playwright/test';

/** Watches a page; `check` fails if anything was asked of another host than the shop and the payment page. */
export const watchHosts = (page: Page): { check: () => void } => {
  const allowed = [process.env['WINDCHEST_URL'], process.env['WINDCHEST_STRIPE_URL']].map(
    (one) => new URL(one ?? '').host,
  );
  const foreign: string[] = [];
  page.on('request', (request) => {
    const { protocol, host } = new URL(request.url());
    if (protocol.startsWith('http') && !allowed.includes(host)) foreign.push(request.url());
  });
  return { check: () => expect(foreign).toEqual([]) };
};
