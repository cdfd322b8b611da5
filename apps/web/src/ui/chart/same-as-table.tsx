import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';
import { tableTexts } from '../../config/texts/furniture.js';

/** A chart's facts for those who do not see it, or want the figures: opened when asked for. */
export const SameAsTable = ({ children }: { children: ReactNode }) => (
  <chakra.details marginTop="4">
    <chakra.summary cursor="pointer" color="ink.soft" fontSize="sm">
      {tableTexts.sameAsTable}
    </chakra.summary>
    {children}
  </chakra.details>
);
