import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useId } from 'react';
import { roomTexts } from '../../config/texts/room.js';
import { roomRange } from './room-range.js';

const thumb = {
  appearance: 'none',
  width: '1.125rem',
  height: '1.125rem',
  borderRadius: 'full',
  border: '0',
  bg: 'ink',
} as const;
const track = { height: '2px', bg: 'edge' } as const;

const Range = chakra('input', {
  base: {
    appearance: 'none',
    bg: 'transparent',
    cursor: 'pointer',
    flex: '1 1 9rem',
    minWidth: '0',
    maxWidth: '21rem',
    height: '1.75rem',
    // Two engines, two names; a rule that names both is dropped whole.
    '&::-webkit-slider-runnable-track': track,
    '&::-moz-range-track': track,
    '&::-webkit-slider-thumb': { ...thumb, marginTop: 'calc(1px - 0.5625rem)' },
    '&::-moz-range-thumb': thumb,
  },
});

export interface RoomSliderProps {
  temperatureC: number;
  onChange: (temperatureC: number) => void;
  /** What the room does to the rank. */
  words: string;
}

/** The temperature of the room the rank is played in. */
export function RoomSlider({ temperatureC, onChange, words }: RoomSliderProps) {
  const id = useId();
  const degrees = roomTexts.degrees(temperatureC);
  return (
    <Box display="flex" alignItems="center" gap="4">
      <Box as="span" fontSize="sm" color="ink.soft" asChild>
        <label htmlFor={id}>{roomTexts.label}</label>
      </Box>
      <Range
        id={id}
        type="range"
        min={roomRange.leastC}
        max={roomRange.mostC}
        step={1}
        value={temperatureC}
        aria-valuetext={`${degrees}, ${words}`}
        onChange={(event) => onChange(event.target.valueAsNumber)}
      />
      <Box as="output" flex="none" minWidth="3.5rem" fontWeight="semibold" asChild>
        <output htmlFor={id}>{degrees}</output>
      </Box>
    </Box>
  );
}
