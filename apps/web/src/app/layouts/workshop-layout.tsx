import type { Permission } from '@windchest/contracts';
import { Navigate, useLocation } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { noPageTexts } from '../../config/texts/no-page.js';
import { workshopTexts } from '../../config/texts/workshop.js';
import { useSession } from '../../lib/session.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { TitleSuffix } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Footer } from './footer.js';
import { Header, type HeaderEntry, HeaderLink } from './header.js';
import { PageFrame } from './page-frame.js';

/** `unless`: who may do that finds the entry within another one. */
const entries: readonly (HeaderEntry & { needs: Permission; unless?: Permission })[] = [
  { to: paths.workshop.overview.to(), label: workshopTexts.overview, isExact: true, needs: 'workshop:enter' },
  { to: paths.workshop.kits.to(), label: workshopTexts.kits, needs: 'kits:read' },
  { to: paths.workshop.orders.to(), label: workshopTexts.orders, needs: 'orders:read' },
  {
    to: paths.workshop.receipts.to(),
    label: workshopTexts.receipts,
    needs: 'orders:read',
    unless: 'ledger:read',
  },
  { to: paths.workshop.sales.to(), label: workshopTexts.ledger, needs: 'ledger:read' },
  { to: paths.workshop.coupons.to(), label: workshopTexts.coupons, needs: 'coupons:read' },
  { to: paths.workshop.supporters.to(), label: workshopTexts.supporters, needs: 'supporters:read' },
  { to: paths.workshop.holders.to(), label: workshopTexts.holders, needs: 'buyers:read' },
  { to: paths.workshop.fit.to(), label: workshopTexts.fit, needs: 'fit:read' },
  { to: paths.workshop.journal.to(), label: workshopTexts.journal, needs: 'journal:write' },
  { to: paths.workshop.letters.to(), label: workshopTexts.letters, needs: 'letters:read' },
  { to: paths.workshop.people.to(), label: workshopTexts.people, needs: 'people:read' },
];

/** The door of the staff side. The API asks again at every route; this only spares a visitor empty screens. */
export function WorkshopLayout() {
  const { person, fault, session, may, refresh } = useSession();
  const { pathname, search } = useLocation();
  if (session && !person) return <Navigate to={signInThenBack(pathname + search)} replace />;

  const refusal = may('workshop:enter') ? undefined : (
    <Band>
      {session ? (
        <Fault level={1} fault={{ title: noPageTexts.forbidden, detail: noPageTexts.forbiddenDetail }}>
          <LinkButton look="outline" size="sm" to={paths.home.to()}>
            {noPageTexts.toKits}
          </LinkButton>
        </Fault>
      ) : fault ? (
        <Fault level={1} fault={fault} onAgain={refresh} />
      ) : (
        <SkeletonLines lines={5} />
      )}
    </Band>
  );

  return (
    <TitleSuffix value={workshopTexts.name}>
      <PageFrame
        skipLabel={workshopTexts.skip}
        header={
          <Header
            name={workshopTexts.name}
            navigationLabel={workshopTexts.navigation}
            menuLabels={{ open: workshopTexts.menu, close: workshopTexts.closeMenu }}
            entries={entries.filter(
              ({ needs, unless }) => may(needs) && (unless === undefined || !may(unless)),
            )}
            extras={
              person && <HeaderLink to={paths.account.to()}>{workshopTexts.roles[person.role]}</HeaderLink>
            }
          />
        }
        footer={
          <Footer label={workshopTexts.footer}>
            <TextLink to={paths.home.to()}>{workshopTexts.toShop}</TextLink>
          </Footer>
        }
      >
        {refusal}
      </PageFrame>
    </TitleSuffix>
  );
}
