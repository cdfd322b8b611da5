import { type RouteObject, useRoutes } from 'react-router-dom';
import { lazyPage } from './lazy-page.js';
import { accountRoutes } from './routes/account-routes.js';
import { journalRoutes } from './routes/journal-routes.js';
import { letterRoutes } from './routes/letter-routes.js';
import { orderRoutes } from './routes/order-routes.js';

const pages: RouteObject[] = [
  ...accountRoutes,
  ...orderRoutes,
  ...journalRoutes,
  ...letterRoutes,
  { path: '*', element: lazyPage(async () => (await import('./not-found.page.js')).NotFoundPage) },
];

/** Pages a first visit seldom opens, and the one for addresses nobody has. */
export const FurtherPages = () => useRoutes(pages);
