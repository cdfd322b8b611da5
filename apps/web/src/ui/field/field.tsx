import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ReactNode, useId } from 'react';
import type { FieldError } from 'react-hook-form';
import { fieldTexts } from '../../config/texts/furniture.js';
import { Sign } from '../sign.js';

export const FieldLabel = chakra('label', {
  base: { display: 'block', fontSize: 'sm', fontWeight: 'semibold', lineHeight: 'snug', marginBottom: '1.5' },
});

export interface FieldCommon {
  label: ReactNode;
  /** A sentence under the label: what to write, and why it is asked. */
  hint?: ReactNode;
  /** The form's own fault for this field, or a sentence. */
  error?: FieldError | string;
  isOptional?: boolean;
}

export interface FieldAria {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
}

export interface FieldProps extends FieldCommon {
  id?: string;
  children: (aria: FieldAria) => ReactNode;
}

export const faultText = (error: FieldCommon['error']): string | undefined =>
  typeof error === 'string' ? error || undefined : error && (error.message || fieldTexts.refused);

/** Why a field was refused: beside it, with a sign, and announced by the field itself. */
export const FieldFault = ({ id, children }: { id: string; children: ReactNode }) => (
  <Box id={id} display="flex" gap="1.5" marginTop="1.5" fontSize="sm" lineHeight="snug" color="stop">
    <Sign name="stop" marginTop="0.2em" />
    <span>{children}</span>
  </Box>
);

/** Label, hint and fault around one control. */
export function Field({ id, label, hint, error, isOptional, children }: FieldProps) {
  const ownId = useId();
  const fieldId = id ?? ownId;
  const fault = faultText(error);
  const described = [hint && `${fieldId}-hint`, fault && `${fieldId}-fault`].filter(Boolean).join(' ');
  return (
    <Box>
      <FieldLabel htmlFor={fieldId}>
        {label}
        {isOptional && (
          <Box as="span" fontWeight="normal" color="ink.soft">
            {' '}
            {fieldTexts.optional}
          </Box>
        )}
      </FieldLabel>
      {hint && (
        <Box
          id={`${fieldId}-hint`}
          fontSize="sm"
          lineHeight="snug"
          color="ink.soft"
          marginTop="-0.5"
          marginBottom="2"
          maxWidth="measure"
        >
          {hint}
        </Box>
      )}
      {children({
        id: fieldId,
        'aria-describedby': described || undefined,
        'aria-invalid': fault ? true : undefined,
      })}
      {fault && <FieldFault id={`${fieldId}-fault`}>{fault}</FieldFault>}
    </Box>
  );
}
