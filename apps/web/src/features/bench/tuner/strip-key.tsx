import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';

const Band = chakra('rect', { base: { fill: 'kit.wash', stroke: 'kit.lit', strokeWidth: '1' } });
const Needle = chakra('path', { base: { fill: 'kit.deep' } });
const Bars = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1' } });

const Entry = ({ drawn, words }: { drawn: ReactNode; words: string }) => (
  <Box as="li" display="inline-flex" alignItems="center" gap="1.5">
    <chakra.svg width="18px" height="12px" flex="none" aria-hidden>
      {drawn}
    </chakra.svg>
    {words}
  </Box>
);

/** What the marks on the strip mean. */
export const StripKey = ({ hasForeseen }: { hasForeseen: boolean }) => (
  <Box
    as="ul"
    listStyle="none"
    display="flex"
    flexWrap="wrap"
    columnGap="5"
    marginTop="1.5"
    textStyle="small"
    color="ink.soft"
  >
    <Entry drawn={<Needle d="M9 12 5 0h8z" />} words={texts.strip.heard} />
    {hasForeseen && (
      <Entry drawn={<Band x={1} y={1.5} width={16} height={9} />} words={texts.strip.foreseen} />
    )}
    <Entry drawn={<Bars d="M5.5 0v12M12.5 0v12" />} words={texts.strip.declared} />
  </Box>
);
