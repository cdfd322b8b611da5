import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { Sign } from './sign.js';

export interface NoticeProps {
  tone?: 'note' | 'ok' | 'warn' | 'stop';
  title?: ReactNode;
  children?: ReactNode;
  /** Announced when it appears; leave out where it stands on the page from the start. */
  isNews?: boolean;
}

/** Something to know beside the work at hand. */
export const Notice = ({ tone = 'note', title, children, isNews }: NoticeProps) => {
  const colour = tone === 'note' ? 'ink' : tone;
  return (
    <Box
      role={isNews ? 'status' : undefined}
      display="flex"
      gap="3"
      paddingBlock="3"
      borderBlockWidth="1px"
      borderColor={tone === 'note' ? 'hairline' : colour}
      maxWidth="measure"
    >
      <Sign name={tone} color={colour} marginTop="0.32em" />
      <Box flex="1" minWidth="0">
        {title && <Box fontWeight="semibold">{title}</Box>}
        {children && <Box color={title ? 'ink.soft' : 'ink'}>{children}</Box>}
      </Box>
    </Box>
  );
};
