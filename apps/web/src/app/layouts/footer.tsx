import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { ColourSwitch } from '../../ui/colour-switch.js';
import { gutter } from '../../ui/sheet.js';

export const Footer = ({ label, children }: { label: string; children?: ReactNode }) => (
  <Box as="footer" aria-label={label} marginTop="auto" fontSize="sm">
    <Box
      maxWidth="page"
      marginInline="auto"
      paddingInline={gutter}
      paddingBlock="5"
      display="flex"
      flexWrap="wrap"
      alignItems="center"
      justifyContent="space-between"
      columnGap="8"
      rowGap="3"
    >
      <Box display="flex" flexWrap="wrap" columnGap="6" rowGap="2">
        {children}
      </Box>
      <ColourSwitch />
    </Box>
  </Box>
);
