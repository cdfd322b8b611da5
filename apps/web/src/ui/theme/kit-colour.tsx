import { Box, type BoxProps } from '@chakra-ui/react/box';
import type { KitPalette } from './kit-palette.js';

export interface KitColourProps extends BoxProps {
  /** The filament colour the maker chose. */
  palette: KitPalette;
}

/** Things of one kit stand inside this; only there `kit`, `kit.deep`, `kit.wash` have the kit's colour. */
export const KitColour = ({ palette, ...box }: KitColourProps) => <Box data-kit={palette} {...box} />;
