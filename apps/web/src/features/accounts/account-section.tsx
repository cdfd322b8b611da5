import { Box } from '@chakra-ui/react/box';
import { type ReactNode, useId } from 'react';
import { Heading } from '../../ui/text.js';

/** A ruled part of the account page: its name at the left, what it holds beside it. */
export function AccountSection({ title, children }: { title: string; children: ReactNode }) {
  const id = useId();
  return (
    <Box
      as="section"
      aria-labelledby={id}
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '14rem minmax(0, 1fr)' }}
      columnGap="8"
      rowGap="4"
      paddingBlock={{ base: '6', md: '8' }}
      borderTopWidth="1px"
      borderColor="hairline"
    >
      <Heading level={2} look="subsection" id={id}>
        {title}
      </Heading>
      <Box minWidth="0">{children}</Box>
    </Box>
  );
}
