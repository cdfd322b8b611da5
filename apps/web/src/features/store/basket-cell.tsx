import type { KitPage, Licence } from '@windchest/contracts';
import { useEffect, useRef, useState } from 'react';
import { paths } from '../../config/paths.js';
import { kitTexts } from '../../config/texts/kit.js';
import { basketLimit, useBasket } from '../../lib/basket.js';
import { Button, LinkButton } from '../../ui/button.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { takeCodeAlong } from '../basket/coupon-code.js';
import type { Offer } from './offers.js';

export interface BasketCellProps {
  kit: KitPage;
  licence: Licence;
  offer: Offer | undefined;
  isOwned: boolean;
}

/** The main action: into the basket; then to the basket; to the shelf for who has the kit. */
export function BasketCell({ kit, licence, offer, isOwned }: BasketCellProps) {
  const { items, holds, add } = useBasket();
  const [isJustPut, setIsJustPut] = useState(false);
  const link = useRef<HTMLAnchorElement>(null);
  const isHeld = holds(licence.id);
  // The pressed button is gone; whoever pressed it by keyboard goes on from where it stood.
  useEffect(() => {
    if (isHeld && isJustPut) link.current?.focus({ preventScroll: true });
  }, [isHeld, isJustPut]);

  const put = () => {
    add({ kitSlug: kit.slug, licenceId: licence.id });
    if (offer) takeCodeAlong(offer.code);
    setIsJustPut(true);
  };
  if (isHeld)
    return (
      <>
        <LinkButton look="cell" ref={link} to={paths.basket.to()}>
          {kitTexts.inBasket}
        </LinkButton>
        {isJustPut && <VisuallyHidden role="status">{kitTexts.putSpoken(kit.name)}</VisuallyHidden>}
      </>
    );
  if (isOwned)
    return (
      <LinkButton look="cell" to={paths.shelfKit.to({ slug: kit.slug })}>
        {kitTexts.owned}
      </LinkButton>
    );
  if (items.length >= basketLimit)
    return (
      <LinkButton look="cell" to={paths.basket.to()}>
        {kitTexts.full}
      </LinkButton>
    );
  return (
    <Button look="cell" onClick={put}>
      {kitTexts.put}
    </Button>
  );
}
