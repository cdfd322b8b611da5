import { chakra } from '@chakra-ui/react/styled-system';

/** A form whose fields stand under each other. Checked by its schema, not by the browser's own bubbles. */
export const Form = chakra(
  'form',
  { base: { display: 'grid', gap: '4', justifyItems: 'stretch', '& > button': { justifySelf: 'start' } } },
  { defaultProps: { noValidate: true } },
);
