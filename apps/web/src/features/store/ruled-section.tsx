import { Box } from '@chakra-ui/react/box';
import { type ReactNode, useId } from 'react';
import { Heading } from '../../ui/text.js';

export interface RuledSectionProps {
  title: string;
  /** Drawings take all of the width that is left; text keeps to its measure. */
  isWide?: boolean;
  children: ReactNode;
}

/** A part of a kit's papers: its name at the left, what it says at the right, a hairline between two. */
export function RuledSection({ title, isWide, children }: RuledSectionProps) {
  const id = useId();
  return (
    <Box
      as="section"
      aria-labelledby={id}
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '17rem minmax(0, 1fr)' }}
      columnGap="12"
      rowGap="4"
      paddingBlock={{ base: '6', md: '8' }}
      css={{ '& + &': { borderTopWidth: '1px', borderColor: 'hairline' } }}
    >
      <Heading level={2} look="subsection" id={id}>
        {title}
      </Heading>
      <Box minWidth="0" maxWidth={isWide ? undefined : '46rem'}>
        {children}
      </Box>
    </Box>
  );
}
