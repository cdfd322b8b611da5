import { Box, type BoxProps } from '@chakra-ui/react/box';

/** A printed strip in the kit's colour, where no drawing of the kit is at hand. Stands inside `KitColour`. */
export const FilamentSwatch = (props: BoxProps) => (
  <Box
    aria-hidden
    flex="none"
    width="0.75rem"
    minHeight="1.25rem"
    bg="kit"
    backgroundImage="repeating-linear-gradient(to top, transparent 0 3px, {colors.kit.line} 3px 4px)"
    borderTopWidth="2px"
    borderColor="kit.deep"
    {...props}
  />
);
