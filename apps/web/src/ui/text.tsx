import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps } from 'react';

const Base = chakra('p');
const levels = ['h1', 'h2', 'h3', 'h4'] as const;
const usualLook = { 1: 'title', 2: 'section', 3: 'subsection', 4: 'body' } as const;

export interface HeadingProps extends Omit<ComponentProps<typeof Base>, 'as'> {
  level: 1 | 2 | 3 | 4;
  /** How large it is drawn, where that differs from its level. */
  look?: 'display' | 'title' | 'section' | 'subsection' | 'body';
}

export const Heading = ({ level, look = usualLook[level], ...rest }: HeadingProps) => (
  <Base as={levels[level - 1]} textStyle={look} fontWeight="bold" {...rest} />
);

export interface TextProps extends ComponentProps<typeof Base> {
  look?: 'lead' | 'body' | 'small' | 'label' | 'lettering';
  /** Ink by default; soft for what is read second. */
  isSoft?: boolean;
}

export const Text = ({ look = 'body', isSoft, ...rest }: TextProps) => (
  <Base textStyle={look} maxWidth="measure" color={isSoft ? 'ink.soft' : undefined} {...rest} />
);
