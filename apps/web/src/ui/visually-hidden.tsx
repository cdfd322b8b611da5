import { chakra } from '@chakra-ui/react/styled-system';

/** Heard, not seen. */
export const VisuallyHidden = chakra('span', { base: { srOnly: true } });
