import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps } from 'react';

const strokes = {
  ok: 'M2.5 8.6 6.2 12.3 13.5 3.8',
  warn: 'M8 2.2V9.6M8 12.4V14',
  stop: 'M3.2 3.2 12.8 12.8M12.8 3.2 3.2 12.8',
  wait: 'M8 1.8A6.2 6.2 0 1 0 8 14.2 6.2 6.2 0 1 0 8 1.8M8 4.6V8.4L10.6 10',
  none: 'M3 8H13',
  note: 'M8 1.8A6.2 6.2 0 1 0 8 14.2 6.2 6.2 0 1 0 8 1.8M8 7.2V11.4M8 4.4V5.2',
} as const;

export type SignName = keyof typeof strokes;

const Svg = chakra('svg', {
  base: {
    display: 'inline-block',
    width: '0.875em',
    height: '0.875em',
    flex: 'none',
    verticalAlign: '-0.06em',
  },
});

export interface SignProps extends ComponentProps<typeof Svg> {
  name: SignName;
}

/** A drawn sign; the word beside it carries the meaning for those who do not see it. */
export const Sign = ({ name, ...rest }: SignProps) => (
  <Svg viewBox="0 0 16 16" fill="none" stroke="currentColor" strokeWidth="2.2" aria-hidden {...rest}>
    <path d={strokes[name]} />
  </Svg>
);
