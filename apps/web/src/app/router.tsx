import { lazy } from 'react';
import { BrowserRouter, type RouteObject, useLocation, useRoutes } from 'react-router-dom';
import { paths } from '../config/paths.js';
import { lazyPage } from './lazy-page.js';
import { ShopLayout } from './layouts/shop-layout.js';
import { shopRoutes } from './routes/shop-routes.js';

/** The table of the rarer addresses comes when one of them is opened: each entry weighs on the first page. */
const further: RouteObject = {
  path: '*',
  element: lazyPage(async () => (await import('./further-pages.js')).FurtherPages),
};

const shop: RouteObject[] = [{ element: <ShopLayout />, children: [...shopRoutes, further] }];

const ShopRouter = () => useRoutes(shop);
const WorkshopRouter = lazy(async () => ({ default: (await import('./workshop-router.js')).WorkshopRouter }));

/** A visitor does not carry the table of the staff's routes. */
function Routes() {
  const door = paths.workshop.overview.path;
  const { pathname } = useLocation();
  return pathname === door || pathname.startsWith(`${door}/`) ? <WorkshopRouter /> : <ShopRouter />;
}

/**
 * The declarative router: the one with loaders and actions weighs 15 kB more, and the pages read their data
 * by SWR.
 */
export const Router = () => (
  <BrowserRouter>
    <Routes />
  </BrowserRouter>
);
