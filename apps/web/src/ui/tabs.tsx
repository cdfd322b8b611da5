import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';
import { RouterNavLink } from './router-link.js';

const TabLink = chakra(RouterNavLink, {
  base: {
    display: 'block',
    paddingBlock: '2.5',
    color: 'ink.soft',
    whiteSpace: 'nowrap',
    borderBottomWidth: '2px',
    borderColor: 'transparent',
    marginBottom: '-1px',
    _hover: { color: 'ink' },
    '&[aria-current=page]': { color: 'ink', fontWeight: 'semibold', borderColor: 'ink' },
    _focusVisible: { outlineOffset: '-2px' },
  },
});

export interface TabsProps {
  label: string;
  tabs: readonly { to: string; label: ReactNode; isExact?: boolean }[];
}

/** Views of one thing, each with an address of its own. */
export const Tabs = ({ label, tabs }: TabsProps) => (
  <Box as="nav" aria-label={label} borderBottomWidth="1px" borderColor="hairline" overflowX="auto">
    <Box as="ul" display="flex" gap="6" listStyle="none">
      {tabs.map((tab) => (
        <li key={tab.to}>
          <TabLink to={tab.to} isExact={tab.isExact ?? true}>
            {tab.label}
          </TabLink>
        </li>
      ))}
    </Box>
  </Box>
);
