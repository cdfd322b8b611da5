import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps, WheelEvent } from 'react';
import { recipes } from '../theme/recipes.js';
import { Field, type FieldCommon } from './field.js';

const Input = chakra('input', recipes.control);

export interface NumberFieldProps extends FieldCommon, ComponentProps<typeof Input> {
  /** Stands in the field after the number: "mm", "%". */
  unit?: string;
}

/** Rolling the page over a focused number would else change it unnoticed. */
const letPageScroll = (event: WheelEvent<HTMLInputElement>) => event.currentTarget.blur();

/** A number. Spread `register('name', {valueAsNumber: true})`. */
export const NumberField = ({ label, hint, error, isOptional, id, unit, ...input }: NumberFieldProps) => (
  <Field {...{ id, label, hint, error, isOptional }}>
    {(aria) => (
      <Box position="relative">
        <Input
          type="number"
          inputMode="decimal"
          step="any"
          onWheel={letPageScroll}
          paddingInlineEnd={unit ? `${unit.length + 2.5}ch` : undefined}
          css={{
            appearance: 'textfield',
            '&::-webkit-inner-spin-button, &::-webkit-outer-spin-button': { appearance: 'none', margin: 0 },
          }}
          {...input}
          {...aria}
        />
        {unit && (
          <Box
            as="span"
            position="absolute"
            insetBlock="0"
            right="3"
            display="flex"
            alignItems="center"
            color="ink.soft"
            pointerEvents="none"
          >
            {unit}
          </Box>
        )}
      </Box>
    )}
  </Field>
);
