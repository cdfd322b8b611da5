import { Box, type BoxProps } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';

export const gutter = { base: '5', md: '8', lg: '12' } as const;

export interface BandProps extends BoxProps {
  /** A sheet lies on the ground; it ends with an ink rule. */
  tone?: 'sheet' | 'ground';
}

/** A horizontal part of a page, as wide as the window, its content within the page's width. */
export const Band = ({ tone = 'ground', children, ...rest }: BandProps) => (
  <Box
    bg={tone}
    borderBottomWidth={tone === 'sheet' ? '1px' : undefined}
    borderColor="ink"
    paddingBlock={{ base: '7', md: '10' }}
    {...rest}
  >
    <Box maxWidth="page" marginInline="auto" paddingInline={gutter}>
      {children}
    </Box>
  </Box>
);

export interface SplitSheetProps {
  /** The drawing and what belongs to it. */
  main: ReactNode;
  /** Beside it, behind a rule: what can be done. */
  aside: ReactNode;
  /** Closes the aside at its foot: the title block. */
  block?: ReactNode;
  asideLabel?: string;
}

/** A sheet ruled into the drawing and a column that ends with the title block. */
export const SplitSheet = ({ main, aside, block, asideLabel }: SplitSheetProps) => (
  <Box bg="sheet" borderBottomWidth="1px" borderColor="ink">
    <Box
      maxWidth="page"
      marginInline="auto"
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 1fr) minmax(20rem, 30%)' }}
      minHeight={{ lg: '32rem' }}
    >
      <Box paddingInline={gutter} paddingBlock={{ base: '7', md: '10' }} minWidth="0">
        {main}
      </Box>
      <Box
        as="aside"
        aria-label={asideLabel}
        display="flex"
        flexDirection="column"
        borderColor="ink"
        borderTopWidth={{ base: '1px', lg: '0' }}
        borderLeftWidth={{ lg: '1px' }}
        borderRightWidth={{ '2xl': '1px' }}
        minWidth="0"
      >
        <Box flex="1" paddingInline={{ base: '5', md: '8', lg: '7' }} paddingBlock={{ base: '7', md: '10' }}>
          {aside}
        </Box>
        {block}
      </Box>
    </Box>
  </Box>
);
