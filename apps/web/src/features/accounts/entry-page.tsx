import { Box } from '@chakra-ui/react/box';
import { type ReactNode, useEffect, useRef } from 'react';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';

export interface EntryPageProps {
  title: string;
  lead?: ReactNode;
  children?: ReactNode;
}

/** A page with one thing to do. */
export const EntryPage = ({ title, lead, children }: EntryPageProps) => (
  <Band tone="sheet" minHeight={{ lg: '32rem' }}>
    <PageTitle title={title} />
    <Heading level={1}>{title}</Heading>
    {lead && (
      <Text look="lead" marginTop="2">
        {lead}
      </Text>
    )}
    <Box marginTop="7" maxWidth="narrow">
      {children}
    </Box>
  </Band>
);

export interface ArrivedHeadingProps {
  level: 1 | 2;
  children: ReactNode;
}

/** The heading of what has taken a form's place: it takes the focus the form had, so that it is read out. */
export function ArrivedHeading({ level, children }: ArrivedHeadingProps) {
  const ref = useRef<HTMLParagraphElement>(null);
  useEffect(() => ref.current?.focus(), []);
  return (
    <Heading level={level} ref={ref} tabIndex={-1} outline="none">
      {children}
    </Heading>
  );
}
