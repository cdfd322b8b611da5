import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { Checkbox } from '../../ui/field/checkbox.js';

const Group = chakra('fieldset', { base: { border: '0', padding: '0', margin: '0', minWidth: '0' } });

export interface TickGroupProps<T extends string | number> {
  legend: string;
  options: readonly { value: T; label: string }[];
  chosen: readonly T[];
  onChange: (chosen: T[]) => void;
}

/** Some of a few; none ticked asks nothing. */
export function TickGroup<T extends string | number>({
  legend,
  options,
  chosen,
  onChange,
}: TickGroupProps<T>) {
  if (options.length === 0) return null;
  return (
    <Group>
      <Box as="legend" fontSize="sm" fontWeight="semibold" marginBottom="1">
        {legend}
      </Box>
      <Box display="flex" flexWrap="wrap" columnGap="5" rowGap="1.5">
        {options.map(({ value, label }) => (
          <Checkbox
            key={value}
            label={label}
            checked={chosen.includes(value)}
            onChange={(event) =>
              onChange(event.target.checked ? [...chosen, value] : chosen.filter((one) => one !== value))
            }
          />
        ))}
      </Box>
    </Group>
  );
}
