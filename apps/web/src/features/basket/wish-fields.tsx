import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';

export interface WishFieldsProps {
  /** What opens them. */
  box: ReactNode;
  isOpen: boolean;
  label: string;
  children: ReactNode;
}

/** Fields that are there only for who ticks the box above them. */
export const WishFields = ({ box, isOpen, label, children }: WishFieldsProps) => (
  <Box>
    {box}
    {isOpen && (
      <Box
        role="group"
        aria-label={label}
        display="grid"
        gap="4"
        marginTop="3"
        marginLeft="0.5rem"
        paddingLeft="1.2rem"
        borderLeftWidth="1px"
        borderColor="hairline"
      >
        {children}
      </Box>
    )}
  </Box>
);
