import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps } from 'react';
import { recipes } from '../theme/recipes.js';
import { Field, type FieldCommon } from './field.js';

const SelectElement = chakra('select', recipes.control);

export interface SelectOption {
  value: string;
  label: string;
  isDisabled?: boolean;
}

export interface SelectFieldProps extends FieldCommon, ComponentProps<typeof SelectElement> {
  options: readonly SelectOption[];
  /** The empty first choice: "Choose a country". */
  emptyLabel?: string;
}

/** One of a few. The browser's own select: it works with every keyboard, reader and telephone. */
export const SelectField = ({
  label,
  hint,
  error,
  isOptional,
  id,
  options,
  emptyLabel,
  ...select
}: SelectFieldProps) => (
  <Field {...{ id, label, hint, error, isOptional }}>
    {(aria) => (
      <Box position="relative">
        <SelectElement appearance="none" paddingInlineEnd="9" cursor="pointer" {...select} {...aria}>
          {emptyLabel !== undefined && <option value="">{emptyLabel}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.isDisabled}>
              {option.label}
            </option>
          ))}
        </SelectElement>
        <chakra.svg
          viewBox="0 0 12 8"
          width="0.75rem"
          height="0.5rem"
          position="absolute"
          right="3.5"
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
    )}
  </Field>
);
