import type { RouteObject } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

export const letterRoutes: RouteObject[] = [
  {
    path: paths.news.path,
    element: lazyPage(async () => (await import('../../features/letters/news.page.js')).NewsPage),
  },
  {
    path: paths.newsConfirm.path,
    element: lazyPage(
      async () => (await import('../../features/letters/confirm-news.page.js')).ConfirmNewsPage,
    ),
  },
  {
    path: paths.unsubscribe.path,
    element: lazyPage(
      async () => (await import('../../features/letters/unsubscribe.page.js')).UnsubscribePage,
    ),
  },
  {
    path: paths.letters.path,
    element: lazyPage(async () => (await import('../../features/letters/archive.page.js')).ArchivePage),
  },
  {
    path: paths.letter.path,
    element: lazyPage(
      async () => (await import('../../features/letters/archived-letter.page.js')).ArchivedLetterPage,
    ),
  },
  {
    path: paths.ownLetter.path,
    element: lazyPage(async () => (await import('../../features/letters/own-letter.page.js')).OwnLetterPage),
  },
];
