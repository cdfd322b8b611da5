import { chakra } from '@chakra-ui/react/styled-system';

const box = {
  appearance: 'none',
  flex: 'none',
  display: 'inline-grid',
  placeContent: 'center',
  width: '1.125rem',
  height: '1.125rem',
  marginTop: '0.1875rem',
  bg: 'sheet',
  borderWidth: '1.5px',
  borderColor: 'edge',
  cursor: 'pointer',
  _before: { content: '""', transform: 'scale(0)' },
  _checked: { borderColor: 'ink', _before: { transform: 'none' } },
  _invalid: { borderColor: 'stop' },
  _disabled: { borderColor: 'hairline', cursor: 'not-allowed' },
} as const;

/** A box to tick. The browser's own one has a ground of its own in the dark, and it is not the sheet's. */
export const CheckboxInput = chakra(
  'input',
  {
    base: {
      ...box,
      borderRadius: 'sm',
      _checked: { ...box._checked, bg: 'ink' },
      _before: {
        ...box._before,
        width: '0.7rem',
        height: '0.7rem',
        bg: 'ink.contrast',
        clipPath: 'polygon(14% 44%, 0 60%, 40% 98%, 100% 18%, 84% 4%, 38% 67%)',
      },
    },
  },
  { defaultProps: { type: 'checkbox' } },
);

/** A ring to choose by. */
export const RadioInput = chakra(
  'input',
  {
    base: {
      ...box,
      borderRadius: 'full',
      _before: { ...box._before, width: '0.625rem', height: '0.625rem', borderRadius: 'full', bg: 'ink' },
    },
  },
  { defaultProps: { type: 'radio' } },
);
