import { chakra } from '@chakra-ui/react/styled-system';

export const mainId = 'main';

const Anchor = chakra('a', {
  base: {
    position: 'fixed',
    left: '3',
    top: '3',
    zIndex: '10',
    paddingInline: '4',
    paddingBlock: '2',
    bg: 'ink',
    color: 'ink.contrast',
    fontWeight: 'semibold',
    borderRadius: 'sm',
    transform: 'translateY(-200%)',
    _focus: { transform: 'none' },
  },
});

/** The first thing the Tab key reaches: past the header, to the page itself. */
export const SkipLink = ({ children }: { children: string }) => (
  <Anchor href={`#${mainId}`}>{children}</Anchor>
);
