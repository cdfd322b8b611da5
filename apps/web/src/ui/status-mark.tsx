import { Box, type BoxProps } from '@chakra-ui/react/box';
import { Sign, type SignName } from './sign.js';

const colours: Record<SignName, string> = {
  ok: 'ok',
  warn: 'warn',
  stop: 'stop',
  wait: 'ink.soft',
  none: 'ink.soft',
  note: 'ink.soft',
};

export interface StatusMarkProps extends Omit<BoxProps, 'color'> {
  state: SignName;
}

/** How something stands: a sign, the word (children), and colour third. */
export const StatusMark = ({ state, children, ...rest }: StatusMarkProps) => (
  <Box
    as="span"
    display="inline-flex"
    alignItems="baseline"
    gap="1.5"
    color={colours[state]}
    fontWeight="semibold"
    fontSize="sm"
    {...rest}
  >
    <Sign name={state} alignSelf="center" />
    <span>{children}</span>
  </Box>
);

/** A line of a checklist: the sign has its colour, the sentence is plain ink. */
export const StatusLine = ({ state, children, ...rest }: StatusMarkProps) => (
  <Box
    as="li"
    display="flex"
    gap="2.5"
    paddingBlock="2"
    borderBottomWidth="1px"
    borderColor="hairline"
    {...rest}
  >
    <Sign name={state} color={colours[state]} marginTop="0.35em" />
    <Box flex="1" minWidth="0">
      {children}
    </Box>
  </Box>
);
