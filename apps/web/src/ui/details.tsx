import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';

const Summary = chakra('summary', {
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    gap: '2',
    paddingBlock: '1',
    cursor: 'pointer',
    borderRadius: 'sm',
    listStyle: 'none',
    textDecoration: 'underline',
    textDecorationThickness: '1px',
    textDecorationColor: 'edge',
    textUnderlineOffset: '0.2em',
    _hover: { textDecorationColor: 'currentColor' },
    '&::-webkit-details-marker': { display: 'none' },
  },
});

const Opening = chakra('details', { base: { '&[open] > summary > svg': { transform: 'rotate(90deg)' } } });

export interface DetailsProps {
  /** What opens it. */
  summary: ReactNode;
  children: ReactNode;
  /** Under it, when opened. */
  gap?: '2' | '3' | '4';
}

/** Something to look at when wanted. The browser’s own: a link to something inside opens it. */
export const Details = ({ summary, children, gap = '3' }: DetailsProps) => (
  <Opening>
    <Summary>
      <chakra.svg
        viewBox="0 0 8 12"
        width="0.5rem"
        height="0.75rem"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.5"
        flex="none"
        transition="transform"
        transitionDuration="fast"
        aria-hidden
      >
        <path d="M1.5 1 6.5 6 1.5 11" />
      </chakra.svg>
      {summary}
    </Summary>
    <chakra.div marginTop={gap}>{children}</chakra.div>
  </Opening>
);
