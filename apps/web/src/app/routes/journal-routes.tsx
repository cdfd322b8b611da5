import type { RouteObject } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

export const journalRoutes: RouteObject[] = [
  {
    path: paths.journal.path,
    element: lazyPage(async () => (await import('../../features/journal/journal.page.js')).JournalPage),
  },
  {
    path: paths.post.path,
    element: lazyPage(async () => (await import('../../features/journal/post.page.js')).PostPage),
  },
];
