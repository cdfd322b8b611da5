import { Box } from '@chakra-ui/react/box';
import type { Quote } from '@windchest/contracts';
import { useRef, useState } from 'react';
import { basketTexts } from '../../config/texts/basket.js';
import { type BasketItem, useBasket } from '../../lib/basket.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { BasketLine, GoneLine } from './basket-line.js';

export interface BasketLinesProps {
  items: readonly BasketItem[];
  quote: Quote;
  ownedSlugs: readonly string[];
}

/** What lies in the basket. A line taken out goes at once, before the new price is known. */
export function BasketLines({ items, quote, ownedSlugs }: BasketLinesProps) {
  const { remove } = useBasket();
  const list = useRef<HTMLUListElement>(null);
  const [removed, setRemoved] = useState('');
  const takeOut = (licenceId: string, name: string) => {
    remove(licenceId);
    setRemoved(basketTexts.removed(name));
    // The pressed button goes with its line.
    list.current?.focus();
  };
  return (
    <>
      <Box
        as="ul"
        ref={list}
        tabIndex={-1}
        outline="none"
        aria-label={basketTexts.linesLabel}
        listStyle="none"
        borderTopWidth="1px"
        borderColor="ink"
      >
        {items.map(({ licenceId, kitSlug }) => {
          const line = quote.lines.find((one) => one.licenceId === licenceId);
          if (line)
            return (
              <BasketLine
                key={licenceId}
                line={line}
                isOwned={ownedSlugs.includes(line.kitSlug)}
                onRemove={() => takeOut(licenceId, line.kitName)}
              />
            );
          return quote.gone.includes(licenceId) ? (
            <GoneLine key={licenceId} kitSlug={kitSlug} onRemove={() => takeOut(licenceId, kitSlug)} />
          ) : null;
        })}
      </Box>
      <VisuallyHidden role="status">{removed}</VisuallyHidden>
    </>
  );
}
