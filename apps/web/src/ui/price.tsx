import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { priceTexts } from '../config/texts/shared.js';
import { VisuallyHidden } from './visually-hidden.js';

export interface PriceProps {
  /** As it is written: "€16.00". */
  price: string;
  /** Struck out before it, where a coupon lowers the price. */
  original?: string;
  /** Under it: "a third off for the first 150 · 41 left". */
  note?: ReactNode;
  size?: 'md' | 'lg';
  align?: 'start' | 'end';
}

export const Price = ({ price, original, note, size = 'lg', align = 'start' }: PriceProps) => (
  <Box textAlign={align}>
    <Box
      display="inline-flex"
      flexWrap="wrap"
      alignItems="baseline"
      columnGap="1.5"
      justifyContent={align === 'end' ? 'flex-end' : undefined}
    >
      {original && (
        <Box
          as="s"
          fontWeight="normal"
          color="ink.soft"
          fontSize={size === 'lg' ? 'md' : 'sm'}
          order={align === 'end' ? 0 : 1}
        >
          <VisuallyHidden>{priceTexts.before} </VisuallyHidden>
          {original}
        </Box>
      )}
      <Box as="span" fontWeight="bold" fontSize={size === 'lg' ? '2xl' : 'md'} lineHeight="snug">
        {original && <VisuallyHidden>{priceTexts.now} </VisuallyHidden>}
        {price}
      </Box>
    </Box>
    {note && (
      <Box fontSize="sm" fontWeight="semibold" lineHeight="snug" color="kit.deep">
        {note}
      </Box>
    )}
  </Box>
);
