import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { Heading, Text } from './text.js';

export interface EmptyStateProps {
  /** What will stand here: "No kits on your shelf yet". */
  title: string;
  /** How it comes here. */
  children?: ReactNode;
  /** The one next step. */
  action?: ReactNode;
  level?: 2 | 3;
}

export const EmptyState = ({ title, children, action, level = 2 }: EmptyStateProps) => (
  <Box paddingBlock={{ base: '8', md: '12' }} borderBlockWidth="1px" borderColor="hairline">
    <Heading level={level} look="subsection">
      {title}
    </Heading>
    {children && (
      <Text isSoft marginTop="1">
        {children}
      </Text>
    )}
    {action && <Box marginTop="5">{action}</Box>}
  </Box>
);
