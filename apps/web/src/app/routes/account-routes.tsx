import type { RouteObject } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

export const accountRoutes: RouteObject[] = [
  {
    path: paths.join.path,
    element: lazyPage(async () => (await import('../../features/accounts/join.page.js')).JoinPage),
  },
  {
    path: paths.verify.path,
    element: lazyPage(async () => (await import('../../features/accounts/verify.page.js')).VerifyPage),
  },
  {
    path: paths.signIn.path,
    element: lazyPage(async () => (await import('../../features/accounts/sign-in.page.js')).SignInPage),
  },
  {
    path: paths.signInLink.path,
    element: lazyPage(
      async () => (await import('../../features/accounts/sign-in-link.page.js')).SignInLinkPage,
    ),
  },
  {
    path: paths.forgot.path,
    element: lazyPage(async () => (await import('../../features/accounts/forgot.page.js')).ForgotPage),
  },
  {
    path: paths.reset.path,
    element: lazyPage(async () => (await import('../../features/accounts/reset.page.js')).ResetPage),
  },
  {
    path: paths.account.path,
    element: lazyPage(async () => (await import('../../features/accounts/account.page.js')).AccountPage),
  },
  {
    path: paths.pledge.path,
    element: lazyPage(
      async () => (await import('../../features/supporters/own-pledge.page.js')).OwnPledgePage,
    ),
  },
  {
    path: paths.support.path,
    element: lazyPage(async () => (await import('../../features/supporters/support.page.js')).SupportPage),
  },
  {
    path: paths.shelf.path,
    element: lazyPage(async () => (await import('../../features/entitlements/shelf.page.js')).ShelfPage),
  },
  {
    path: paths.shelfKit.path,
    element: lazyPage(
      async () => (await import('../../features/entitlements/shelf-kit.page.js')).ShelfKitPage,
    ),
  },
  {
    path: paths.shelfReprint.path,
    element: lazyPage(async () => (await import('../../features/entitlements/reprint.page.js')).ReprintPage),
  },
  {
    path: paths.tuner.path,
    element: lazyPage(async () => (await import('../../features/entitlements/tuner.page.js')).TunerPage),
  },
  {
    path: paths.shelfFit.path,
    element: lazyPage(async () => (await import('../../features/fit/report-fit.page.js')).ReportFitPage),
  },
];
