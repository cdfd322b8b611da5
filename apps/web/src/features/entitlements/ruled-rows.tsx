import { chakra } from '@chakra-ui/react/styled-system';
import { RouterLink } from '../../ui/router-link.js';

const row = {
  base: {
    display: 'flex',
    width: 'full',
    justifyContent: 'space-between',
    gap: '4',
    paddingBlock: '2.5',
    textAlign: 'start',
    borderBottomWidth: '1px',
    borderColor: 'hairline',
    cursor: 'pointer',
    overflowWrap: 'anywhere',
    _hover: { borderColor: 'ink' },
    _focusVisible: { outlineOffset: '-1px' },
  },
} as const;

/** Lesser actions, one under the other between hairlines. */
export const RowButton = chakra('button', row, { defaultProps: { type: 'button' } });
export const RowLink = chakra(RouterLink, row);
/** To a place on the same page. */
export const RowAnchor = chakra('a', row);
