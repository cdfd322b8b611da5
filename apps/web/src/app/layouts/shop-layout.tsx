import { chakra } from '@chakra-ui/react/styled-system';
import { lazy, Suspense, useState } from 'react';
import { paths } from '../../config/paths.js';
import { shopTexts } from '../../config/texts/shop.js';
import { useBasket } from '../../lib/basket.js';
import { printerText } from '../../lib/printer-text.js';
import { useSession } from '../../lib/session.js';
import { useStoredValue } from '../../lib/stored-value.js';
import { TextLink } from '../../ui/link.js';
import { RouterLink } from '../../ui/router-link.js';
import { TitleSuffix } from '../../ui/page-title.js';
import { Footer } from './footer.js';
import { Header, HeaderLink } from './header.js';
import { PageFrame } from './page-frame.js';

const OwnPrinterDialog = lazy(async () => ({
  default: (await import('../../features/bench/own-printer-dialog.js')).OwnPrinterDialog,
}));

// Visitors without a printer need neither.
const PrinterBed = lazy(async () => ({
  default: (await import('../../features/bench/printer-bed.js')).PrinterBed,
}));

const PrinterButton = chakra('button', {
  base: {
    paddingBlock: { base: '1.5', md: '1' },
    color: 'ink.soft',
    whiteSpace: 'nowrap',
    cursor: 'pointer',
    _hover: { color: 'ink' },
  },
});
const NameLink = chakra(RouterLink, { base: { borderRadius: 'sm' } });

export function ShopLayout() {
  const { session, isSignedIn, may } = useSession();
  const { items } = useBasket();
  const mayHavePrinter = useStoredValue(printerText) !== null || isSignedIn;
  const [isPrinterOpen, setIsPrinterOpen] = useState(false);
  const name = session?.workshop.name ?? '';

  return (
    <TitleSuffix value={name}>
      <PageFrame
        skipLabel={shopTexts.skip}
        header={
          <Header
            name={<NameLink to={paths.home.to()}>{name}</NameLink>}
            navigationLabel={shopTexts.navigation}
            menuLabels={{ open: shopTexts.menu, close: shopTexts.closeMenu }}
            entries={[
              { to: paths.home.to(), label: shopTexts.kits, isExact: true },
              { to: paths.shelf.to(), label: shopTexts.shelf },
              { to: paths.support.to(), label: shopTexts.pledge },
              ...(may('workshop:enter')
                ? [{ to: paths.workshop.overview.to(), label: shopTexts.workshop }]
                : []),
            ]}
            extras={
              <>
                <PrinterButton type="button" aria-haspopup="dialog" onClick={() => setIsPrinterOpen(true)}>
                  {shopTexts.printer}
                  {mayHavePrinter && (
                    <Suspense>
                      <PrinterBed />
                    </Suspense>
                  )}
                </PrinterButton>
                {isSignedIn ? (
                  <HeaderLink to={paths.account.to()}>{shopTexts.account}</HeaderLink>
                ) : (
                  <HeaderLink to={paths.signIn.to()}>{shopTexts.signIn}</HeaderLink>
                )}
              </>
            }
            pinned={
              <HeaderLink
                to={paths.basket.to()}
                aria-label={shopTexts.basketSpoken(items.length)}
                color="ink"
              >
                {items.length ? shopTexts.basketOf(items.length) : shopTexts.basket}
              </HeaderLink>
            }
          />
        }
        footer={
          <Footer label={shopTexts.footer}>
            <TextLink to={paths.journal.to()}>{shopTexts.journal}</TextLink>
            <TextLink to={paths.news.to()}>{shopTexts.news}</TextLink>
            <TextLink to={paths.cautions.to()}>{shopTexts.cautions}</TextLink>
          </Footer>
        }
      />
      {isPrinterOpen && (
        <Suspense>
          <OwnPrinterDialog onClose={() => setIsPrinterOpen(false)} />
        </Suspense>
      )}
    </TitleSuffix>
  );
}
