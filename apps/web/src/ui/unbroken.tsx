import { chakra } from '@chakra-ui/react/styled-system';

/** An amount, a date or a number of an order: it stands on one line. */
export const Unbroken = chakra('span', { base: { whiteSpace: 'nowrap' } });
