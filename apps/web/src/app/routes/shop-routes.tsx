import type { RouteObject } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

export const shopRoutes: RouteObject[] = [
  {
    path: paths.home.path,
    element: lazyPage(async () => (await import('../../features/store/home.page.js')).HomePage),
  },
  {
    path: paths.kit.path,
    element: lazyPage(async () => (await import('../../features/store/kit.page.js')).KitPage),
  },
  {
    path: paths.basket.path,
    element: lazyPage(async () => (await import('../../features/basket/basket.page.js')).BasketPage),
  },
];
