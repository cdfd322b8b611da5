import { type RouteObject, useRoutes } from 'react-router-dom';
import { WorkshopLayout } from './layouts/workshop-layout.js';
import { NotFoundPage } from './not-found.page.js';
import { workshopRoutes } from './routes/workshop-routes.js';

const routes: RouteObject[] = [
  { element: <WorkshopLayout />, children: [...workshopRoutes, { path: '*', element: <NotFoundPage /> }] },
];

/** The staff side, fetched when its door is opened. */
export const WorkshopRouter = () => useRoutes(routes);
