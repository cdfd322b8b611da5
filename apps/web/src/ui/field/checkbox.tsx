import { Box } from '@chakra-ui/react/box';
import { type ComponentProps, useId } from 'react';
import { FieldFault, faultText, type FieldCommon } from './field.js';
import { CheckboxInput } from './tick.js';

export interface CheckboxProps
  extends Omit<FieldCommon, 'isOptional'>, ComponentProps<typeof CheckboxInput> {}

/** One yes or no. Spread `register('name')`. */
export function Checkbox({ label, hint, error, id, ...input }: CheckboxProps) {
  const ownId = useId();
  const fieldId = id ?? ownId;
  const fault = faultText(error);
  const described = [hint && `${fieldId}-hint`, fault && `${fieldId}-fault`].filter(Boolean).join(' ');
  return (
    <Box>
      <Box as="label" display="flex" gap="2.5" cursor="pointer" maxWidth="measure">
        <CheckboxInput
          {...input}
          id={fieldId}
          aria-describedby={described || undefined}
          aria-invalid={fault ? true : undefined}
        />
        <span>{label}</span>
      </Box>
      {hint && (
        <Box
          id={`${fieldId}-hint`}
          marginLeft="1.75rem"
          fontSize="sm"
          lineHeight="snug"
          color="ink.soft"
          maxWidth="measure"
        >
          {hint}
        </Box>
      )}
      {fault && (
        <Box marginLeft="1.75rem">
          <FieldFault id={`${fieldId}-fault`}>{fault}</FieldFault>
        </Box>
      )}
    </Box>
  );
}
