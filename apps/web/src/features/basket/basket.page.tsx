import { Box } from '@chakra-ui/react/box';
import type { Quote } from '@windchest/contracts';
import { lazy, Suspense, useCallback, useState } from 'react';
import { paths } from '../../config/paths.js';
import { basketTexts } from '../../config/texts/basket.js';
import { useBasket } from '../../lib/basket.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button, LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading } from '../../ui/text.js';
import { BasketBlock } from './basket-block.js';
import { BasketLines } from './basket-lines.js';
import { BasketSums } from './basket-sums.js';
import { CouponField } from './coupon-field.js';
import type { BasketWishes } from './checkout-form.js';
import { type QuotedBasket, useQuote } from './use-quote.js';

const formId = 'checkout';

// The form brings its schema and the reader of it along.
const CheckoutForm = lazy(async () => ({ default: (await import('./checkout-form.js')).CheckoutForm }));

const EmptyBasket = () => (
  <Band>
    <Heading level={1} marginBottom="6">
      {basketTexts.title}
    </Heading>
    <EmptyState
      title={basketTexts.empty}
      action={<LinkButton to={paths.home.to()}>{basketTexts.seeKits}</LinkButton>}
    >
      {basketTexts.emptyDetail}
    </EmptyState>
  </Band>
);

function UnpricedBasket({ fault, requote }: Pick<QuotedBasket, 'fault' | 'requote'>) {
  const { clear } = useBasket();
  return (
    <Band tone="sheet" minHeight="32rem">
      <Heading level={1} marginBottom="6">
        {basketTexts.title}
      </Heading>
      {fault ? (
        <Fault level={2} what={basketTexts.failed} fault={fault} onAgain={requote}>
          {fault.code === 'validation-failed' && (
            <Button look="plain" size="sm" onClick={clear}>
              {basketTexts.startAfresh}
            </Button>
          )}
        </Fault>
      ) : (
        <SkeletonLines lines={5} />
      )}
    </Band>
  );
}

interface FilledBasketProps {
  basket: QuotedBasket & { quote: Quote };
  wishes: BasketWishes;
  onWishes: (wishes: BasketWishes) => void;
}

function FilledBasket({ basket, wishes, onWishes }: FilledBasketProps) {
  const { items, quote, code, fault, isCurrent, requote } = basket;
  const { isSignedIn, isLoading } = useSession();
  const owned = useEndpoint('GET /shelf/owned', isSignedIn ? {} : null);
  const [form, setForm] = useState({ isReady: false, isOpening: false });
  const onState = useCallback((state: typeof form) => setForm(state), []);
  const isPayable = quote.lines.length > 0;

  return (
    <SplitSheet
      asideLabel={basketTexts.checkout}
      main={
        <>
          <Heading level={1} marginBottom="6">
            {basketTexts.title}
          </Heading>
          {fault && (
            <Box marginBottom="5">
              <Fault level={2} what={basketTexts.failed} fault={fault} onAgain={requote} />
            </Box>
          )}
          <BasketLines
            items={items}
            quote={quote}
            // Of somebody else's shelf nothing is told, and one's own says nothing about a gift.
            ownedSlugs={wishes.isGift ? [] : (owned.data ?? [])}
          />
          <Box
            display="grid"
            gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) 20rem' }}
            columnGap="12"
            rowGap="6"
            marginTop="5"
          >
            <CouponField quote={quote} code={code} />
            <BasketSums quote={quote} isCurrent={isCurrent} />
          </Box>
        </>
      }
      aside={
        isPayable && (
          <>
            <Heading level={2} look="subsection" marginBottom="5">
              {basketTexts.checkout}
            </Heading>
            {isLoading ? (
              <SkeletonLines lines={6} />
            ) : (
              <Suspense fallback={<SkeletonLines lines={6} />}>
                <CheckoutForm
                  id={formId}
                  quote={quote}
                  isCurrent={isCurrent}
                  requote={requote}
                  onWishes={onWishes}
                  onState={onState}
                />
              </Suspense>
            )}
          </>
        )
      }
      block={
        isPayable && (
          <BasketBlock
            quote={quote}
            formId={formId}
            isReady={form.isReady && isCurrent}
            isOpening={form.isOpening}
          />
        )
      }
    />
  );
}

/** The basket and the way to pay for it. */
export function BasketPage() {
  const [wishes, setWishes] = useState<BasketWishes>({ country: '', vatNumber: null, isGift: false });
  const basket = useQuote(wishes);
  const { quote } = basket;
  return (
    <>
      <PageTitle title={basketTexts.title} />
      {basket.items.length === 0 ? (
        <EmptyBasket />
      ) : quote ? (
        <FilledBasket basket={{ ...basket, quote }} wishes={wishes} onWishes={setWishes} />
      ) : (
        <UnpricedBasket fault={basket.fault} requote={basket.requote} />
      )}
    </>
  );
}
