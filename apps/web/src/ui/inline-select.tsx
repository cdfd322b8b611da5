import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ComponentProps, useId } from 'react';

const SelectElement = chakra('select', {
  base: {
    appearance: 'none',
    font: 'inherit',
    color: 'ink',
    bg: 'transparent',
    paddingInlineEnd: '5',
    paddingBlock: '0.5',
    border: '0',
    borderBottomWidth: '1px',
    borderColor: 'edge',
    borderRadius: 'none',
    cursor: 'pointer',
    _hover: { borderColor: 'ink' },
    '& > option': { bg: 'sheet', color: 'ink' },
  },
});

export interface InlineSelectProps extends ComponentProps<typeof SelectElement> {
  label: string;
  options: readonly { value: string; label: string }[];
}

/** One of a few, within a line of text: "Sort by newest". */
export function InlineSelect({ label, options, id, ...select }: InlineSelectProps) {
  const ownId = useId();
  const fieldId = id ?? ownId;
  return (
    <Box display="inline-flex" alignItems="baseline" gap="1.5" color="ink.soft" whiteSpace="nowrap">
      <label htmlFor={fieldId}>{label}</label>
      <Box position="relative">
        <SelectElement id={fieldId} {...select}>
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </SelectElement>
        <chakra.svg
          viewBox="0 0 12 8"
          width="0.625rem"
          height="0.4rem"
          position="absolute"
          right="1"
          top="50%"
          transform="translateY(-50%)"
          pointerEvents="none"
          aria-hidden
          fill="none"
          stroke="currentColor"
          strokeWidth="1.5"
        >
          <path d="M1 1.5 6 6.5 11 1.5" />
        </chakra.svg>
      </Box>
    </Box>
  );
}
