import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { partPreviewTexts as texts } from '../../../config/texts/part-preview.js';
import { Button } from '../../../ui/button.js';
import type { OrbitStep } from './orbit.js';

/** Strokes in a square of 16. */
const strokes: Record<Exclude<OrbitStep, 'reset'>, string> = {
  left: 'M13 8H3M7 4 3 8l4 4',
  right: 'M3 8h10M9 4l4 4-4 4',
  up: 'M8 13V3M4 7l4-4 4 4',
  down: 'M8 3v10M4 9l4 4 4-4',
  nearer: 'M8 3v10M3 8h10',
  farther: 'M3 8h10',
};
const drawn = Object.keys(strokes) as (keyof typeof strokes)[];

/** For whoever neither drags nor knows the keys. */
export const TurnButtons = ({ onStep }: { onStep: (step: OrbitStep) => void }) => (
  <Box role="group" aria-label={texts.controls} display="flex" flexWrap="wrap" gap="1.5">
    {drawn.map((name) => (
      <Button
        key={name}
        look="outline"
        size="sm"
        paddingInline="2"
        aria-label={texts.steps[name]}
        title={texts.steps[name]}
        onClick={() => onStep(name)}
      >
        <chakra.svg
          viewBox="0 0 16 16"
          width="1rem"
          height="1rem"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.5"
          aria-hidden
        >
          <path d={strokes[name]} />
        </chakra.svg>
      </Button>
    ))}
    <Button look="plain" size="sm" marginLeft="1" onClick={() => onStep('reset')}>
      {texts.steps.reset}
    </Button>
  </Box>
);
