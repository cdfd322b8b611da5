import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ReactNode, useId, useState } from 'react';
import { useLocation } from 'react-router-dom';
import { RouterNavLink } from '../../ui/router-link.js';
import { gutter } from '../../ui/sheet.js';

const Entry = chakra(RouterNavLink, {
  base: {
    display: 'inline-block',
    paddingBlock: { base: '1.5', md: '1' },
    color: 'ink.soft',
    whiteSpace: 'nowrap',
    borderBottomWidth: '2px',
    borderColor: 'transparent',
    _hover: { color: 'ink' },
    '&[aria-current=page]': { color: 'ink', borderColor: 'ink' },
  },
});

const MenuButton = chakra('button', {
  base: { paddingBlock: '2', cursor: 'pointer', fontWeight: 'semibold', borderRadius: 'sm' },
});

export interface HeaderEntry {
  to: string;
  label: string;
  isExact?: boolean;
}

export interface HeaderProps {
  name: ReactNode;
  navigationLabel: string;
  menuLabels: { open: string; close: string };
  entries: readonly HeaderEntry[];
  /** At the right end on a wide screen, in the menu on a small one. */
  extras?: ReactNode;
  /** Always in sight: the basket. */
  pinned?: ReactNode;
}

/** The workshop's name and the ways through; below 768 px they fold into a menu. */
export function Header({ name, navigationLabel, menuLabels, entries, extras, pinned }: HeaderProps) {
  const menuId = useId();
  const { pathname } = useLocation();
  // Open at one address: going to another closes it.
  const [openAt, setOpenAt] = useState<string>();
  const isOpen = openAt === pathname;

  return (
    <Box as="header" borderBottomWidth="1px" borderColor="ink" bg="ground">
      <Box
        maxWidth="page"
        marginInline="auto"
        paddingInline={gutter}
        minHeight={{ base: '3.5rem', md: '4.125rem' }}
        paddingTop={{ md: '4' }}
        display="flex"
        flexWrap="wrap"
        alignItems={{ base: 'center', md: 'baseline' }}
        columnGap={{ base: '5', lg: '9' }}
      >
        <Box
          flex={{ base: '1 1 0', md: 'none' }}
          minWidth="0"
          minHeight="1lh"
          paddingBlock={{ base: '3', md: '0' }}
          fontSize={{ base: 'lg', md: 'xl' }}
          fontWeight="bold"
          letterSpacing="heading"
          lineHeight="tight"
        >
          {name}
        </Box>
        <Box display={{ base: 'flex', md: 'none' }} marginLeft="auto" gap="5" alignItems="center">
          {pinned}
          <MenuButton
            type="button"
            aria-expanded={isOpen}
            aria-controls={menuId}
            onClick={() => setOpenAt(isOpen ? undefined : pathname)}
            aria-label={isOpen ? menuLabels.close : undefined}
          >
            {menuLabels.open}
          </MenuButton>
        </Box>
        <Box
          as="nav"
          id={menuId}
          aria-label={navigationLabel}
          display={{ base: isOpen ? 'flex' : 'none', md: 'flex' }}
          flexDirection={{ base: 'column', md: 'row' }}
          flex={{ base: '1 0 100%', md: '1' }}
          alignItems={{ base: 'flex-start', md: 'baseline' }}
          columnGap={{ base: '5', lg: '7' }}
          paddingBottom={{ base: '4', md: '0' }}
          onKeyDown={(event) => event.key === 'Escape' && setOpenAt(undefined)}
        >
          {entries.map((entry) => (
            <Entry key={entry.to} to={entry.to} isExact={entry.isExact}>
              {entry.label}
            </Entry>
          ))}
          <Box
            display="flex"
            flexDirection={{ base: 'column', md: 'row' }}
            alignItems={{ base: 'flex-start', md: 'baseline' }}
            columnGap={{ base: '5', lg: '8' }}
            marginLeft={{ md: 'auto' }}
          >
            {extras}
            {pinned && <Box display={{ base: 'none', md: 'block' }}>{pinned}</Box>}
          </Box>
        </Box>
      </Box>
    </Box>
  );
}

export { Entry as HeaderLink };
