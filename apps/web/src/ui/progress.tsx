import { Box } from '@chakra-ui/react/box';
import { type ReactNode, useId } from 'react';
import { progressTexts } from '../config/texts/furniture.js';

export interface ProgressProps {
  /** What is going on: "tongue-5.3mf, measuring". */
  label: ReactNode;
  /** 0..1; left out while nobody can say. */
  done?: number;
  /** Instead of the percentage: "3 of 40 files". */
  words?: string;
}

/** A bar and its words. */
export function Progress({ label, done, words }: ProgressProps) {
  const id = useId();
  const percent = done === undefined ? undefined : Math.round(Math.min(1, Math.max(0, done)) * 100);
  const told = words ?? (percent === undefined ? undefined : progressTexts.percent(percent));
  return (
    <Box>
      <Box display="flex" justifyContent="space-between" gap="4" fontSize="sm" marginBottom="1">
        <Box id={id} minWidth="0" overflowWrap="anywhere">
          {label}
        </Box>
        {told && <Box whiteSpace="nowrap">{told}</Box>}
      </Box>
      <Box
        role="progressbar"
        aria-labelledby={id}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        aria-valuetext={told}
        height="6px"
        bg="hairline"
        overflow="hidden"
      >
        <Box
          height="full"
          width="full"
          transformOrigin="left"
          transition="transform"
          transitionDuration="slow"
          style={{ transform: `scaleX(${(percent ?? 100) / 100})` }}
          bg={percent === undefined ? undefined : 'ink'}
          backgroundImage={
            percent === undefined
              ? 'repeating-linear-gradient(135deg, {colors.ink.soft} 0 4px, transparent 4px 10px)'
              : undefined
          }
        />
      </Box>
    </Box>
  );
}
