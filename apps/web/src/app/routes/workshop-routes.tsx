import { Navigate, type RouteObject, useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { lazyPage } from '../lazy-page.js';

/** Parts and gates stand on the revision's first view; addresses that name them lead there. */
const ToRevision = () => {
  const { kitId = '', revisionId = '' } = useParams();
  return <Navigate to={paths.workshop.revision.to({ kitId, revisionId })} replace />;
};

const revisionTabs: RouteObject[] = [
  {
    index: true,
    element: lazyPage(async () => (await import('../../features/catalogue/parts-tab.js')).PartsTab),
  },
  { path: paths.workshop.parts.path, element: <ToRevision /> },
  { path: paths.workshop.gates.path, element: <ToRevision /> },
  {
    path: paths.workshop.notes.path,
    element: lazyPage(async () => (await import('../../features/catalogue/notes-tab.js')).NotesTab),
  },
  {
    path: paths.workshop.specification.path,
    element: lazyPage(
      async () => (await import('../../features/catalogue/specification-tab.js')).SpecificationTab,
    ),
  },
  {
    path: paths.workshop.changes.path,
    element: lazyPage(async () => (await import('../../features/catalogue/changes-tab.js')).ChangesTab),
  },
  {
    path: paths.workshop.files.path,
    element: lazyPage(async () => (await import('../../features/catalogue/files-tab.js')).FilesTab),
  },
];

export const workshopRoutes: RouteObject[] = [
  {
    path: paths.workshop.overview.path,
    element: lazyPage(async () => (await import('../../features/workshop/overview.page.js')).OverviewPage),
  },
  {
    path: paths.workshop.kits.path,
    element: lazyPage(async () => (await import('../../features/catalogue/kits.page.js')).WorkshopKitsPage),
  },
  {
    path: paths.workshop.newKit.path,
    element: lazyPage(async () => (await import('../../features/catalogue/new-kit.page.js')).NewKitPage),
  },
  {
    path: paths.workshop.kit.path,
    element: lazyPage(async () => (await import('../../features/catalogue/kit.page.js')).WorkshopKitPage),
  },
  {
    path: paths.workshop.revision.path,
    element: lazyPage(async () => (await import('../../features/catalogue/revision.page.js')).RevisionPage),
    children: revisionTabs,
  },
  {
    path: paths.workshop.coupons.path,
    element: lazyPage(async () => (await import('../../features/coupons/coupons.page.js')).CouponsPage),
  },
  {
    path: paths.workshop.newCoupon.path,
    element: lazyPage(async () => (await import('../../features/coupons/new-coupon.page.js')).NewCouponPage),
  },
  {
    path: paths.workshop.coupon.path,
    element: lazyPage(async () => (await import('../../features/coupons/coupon.page.js')).CouponPage),
  },
  {
    path: paths.workshop.orders.path,
    element: lazyPage(async () => (await import('../../features/ledger/orders.page.js')).WorkshopOrdersPage),
  },
  {
    path: paths.workshop.order.path,
    element: lazyPage(async () => (await import('../../features/ledger/order.page.js')).WorkshopOrderPage),
  },
  {
    path: paths.workshop.receipts.path,
    element: lazyPage(async () => (await import('../../features/ledger/receipts.page.js')).ReceiptsPage),
  },
  {
    path: paths.workshop.sales.path,
    element: lazyPage(async () => (await import('../../features/ledger/sales.page.js')).SalesPage),
  },
  {
    path: paths.workshop.payments.path,
    element: lazyPage(async () => (await import('../../features/ledger/payments.page.js')).PaymentsPage),
  },
  {
    path: paths.workshop.rates.path,
    element: lazyPage(async () => (await import('../../features/ledger/rates.page.js')).RatesPage),
  },
  {
    path: paths.workshop.quarters.path,
    element: lazyPage(async () => (await import('../../features/ledger/quarters.page.js')).QuartersPage),
  },
  {
    path: paths.workshop.quarter.path,
    element: lazyPage(async () => (await import('../../features/ledger/quarter.page.js')).QuarterPage),
  },
  {
    path: paths.workshop.locations.path,
    element: lazyPage(async () => (await import('../../features/ledger/locations.page.js')).LocationsPage),
  },
  {
    path: paths.workshop.location.path,
    element: lazyPage(async () => (await import('../../features/ledger/location.page.js')).LocationPage),
  },
  {
    path: paths.workshop.reconciliations.path,
    element: lazyPage(
      async () => (await import('../../features/ledger/reconciliations.page.js')).ReconciliationsPage,
    ),
  },
  {
    path: paths.workshop.reconciliation.path,
    element: lazyPage(
      async () => (await import('../../features/ledger/reconciliation.page.js')).ReconciliationPage,
    ),
  },
  {
    path: paths.workshop.exports.path,
    element: lazyPage(async () => (await import('../../features/ledger/exports.page.js')).ExportsPage),
  },
  {
    path: paths.workshop.holders.path,
    element: lazyPage(async () => (await import('../../features/workshop/holders.page.js')).HoldersPage),
  },
  {
    path: paths.workshop.supporters.path,
    element: lazyPage(
      async () => (await import('../../features/supporters/supporters.page.js')).SupportersPage,
    ),
  },
  {
    path: paths.workshop.supporter.path,
    element: lazyPage(
      async () => (await import('../../features/supporters/supporter.page.js')).SupporterPage,
    ),
  },
  {
    path: paths.workshop.plans.path,
    element: lazyPage(async () => (await import('../../features/supporters/plans.page.js')).PlansPage),
  },
  {
    path: paths.workshop.newPlan.path,
    element: lazyPage(async () => (await import('../../features/supporters/new-plan.page.js')).NewPlanPage),
  },
  {
    path: paths.workshop.plan.path,
    element: lazyPage(async () => (await import('../../features/supporters/plan.page.js')).PlanPage),
  },
  {
    path: paths.workshop.fit.path,
    element: lazyPage(async () => (await import('../../features/fit/fit.page.js')).WorkshopFitPage),
  },
  {
    path: paths.workshop.fitReport.path,
    element: lazyPage(async () => (await import('../../features/fit/fit-report.page.js')).FitReportPage),
  },
  {
    path: paths.workshop.journal.path,
    element: lazyPage(async () => (await import('../../features/journal/posts.page.js')).PostsPage),
  },
  {
    path: paths.workshop.newPost.path,
    element: lazyPage(async () => (await import('../../features/journal/new-post.page.js')).NewPostPage),
  },
  {
    path: paths.workshop.post.path,
    element: lazyPage(async () => (await import('../../features/journal/edit-post.page.js')).EditPostPage),
  },
  {
    path: paths.workshop.letters.path,
    element: lazyPage(async () => (await import('../../features/letters/letters.page.js')).LettersPage),
  },
  {
    path: paths.workshop.newLetter.path,
    element: lazyPage(async () => (await import('../../features/letters/new-letter.page.js')).NewLetterPage),
  },
  {
    path: paths.workshop.deadAddresses.path,
    element: lazyPage(
      async () => (await import('../../features/letters/dead-addresses.page.js')).DeadAddressesPage,
    ),
  },
  {
    path: paths.workshop.letter.path,
    element: lazyPage(async () => (await import('../../features/letters/letter.page.js')).WorkshopLetterPage),
  },
  {
    path: paths.workshop.people.path,
    element: lazyPage(async () => (await import('../../features/workshop/people.page.js')).PeoplePage),
  },
  {
    path: paths.workshop.log.path,
    element: lazyPage(async () => (await import('../../features/workshop/log.page.js')).LogPage),
  },
];
