import type { OutputOf } from '@windchest/contracts';

type Waiting = OutputOf<'GET /workshop/overview'>['waiting'][number];

export const overviewTexts = {
  title: 'Overview',
  waiting: 'Waits for you',
  nothing: 'Nothing waits',
  nothingDetail: 'No open draft, no flagged order, no coupon near its end.',
  words: {
    draft: ({ label }) => `${label} is in the making`,
    'flagged-order': ({ count }) =>
      count === 1 ? '1 order has a flag to look at' : `${count} orders have a flag to look at`,
    'dead-job': ({ count }) =>
      count === 1
        ? '1 piece of work gave up after many tries'
        : `${count} pieces of work gave up after many tries`,
    'coupon-low': ({ label, count }) => `${label} has ${count} ${count === 1 ? 'place' : 'places'} left`,
    'fit-report': ({ count }) =>
      count === 1 ? '1 fit report waits for an answer' : `${count} fit reports wait for an answer`,
    letter: ({ label }) => `“${label}” is on its way`,
    'refused-file': ({ label, count }) =>
      `${label}: ${count} ${count === 1 ? 'file was' : 'files were'} refused`,
  } satisfies Record<Waiting['kind'], (one: Waiting) => string>,
  sales: 'Sales of the last 30 days',
  salesWords: (orders: string, gross: string, best: string) =>
    `${orders} for ${gross} in 30 days. The best day was ${best}.`,
  noSales: 'No sales in the last 30 days.',
  day: (day: string, orders: string, gross: string) => `${day}: ${orders}, ${gross}`,
  chart: 'Sales by day, as a bar for each day',
  columns: { day: 'Day', orders: 'Orders', gross: 'Sales' },
  caption: 'Sales by day',
};
