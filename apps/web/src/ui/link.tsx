import { chakra } from '@chakra-ui/react/styled-system';
import { RouterLink } from './router-link.js';

const underlined = {
  base: {
    color: 'inherit',
    textDecoration: 'underline',
    textDecorationThickness: '1px',
    textDecorationColor: 'edge',
    textUnderlineOffset: '0.2em',
    borderRadius: 'sm',
    _hover: { textDecorationColor: 'currentColor' },
  },
} as const;

/** A link in running text, within the shop. */
export const TextLink = chakra(RouterLink, underlined);

/** A link in running text that leaves the application: a download, a mail address. */
export const TextAnchor = chakra('a', underlined);
