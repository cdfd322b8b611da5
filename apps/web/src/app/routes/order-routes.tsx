import type { RouteObject } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

export const orderRoutes: RouteObject[] = [
  {
    path: paths.cautions.path,
    element: lazyPage(async () => (await import('../../features/store/cautions.page.js')).CautionsPage),
  },
  {
    path: paths.order.path,
    element: lazyPage(async () => (await import('../../features/orders/order.page.js')).OrderPage),
  },
  {
    path: paths.collect.path,
    element: lazyPage(async () => (await import('../../features/entitlements/collect.page.js')).CollectPage),
  },
];
