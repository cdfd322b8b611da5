import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps } from 'react';
import { recipes } from '../theme/recipes.js';
import { Field, type FieldCommon } from './field.js';

const Input = chakra('input', recipes.control);
const Area = chakra('textarea', recipes.control);

export interface TextFieldProps extends FieldCommon, ComponentProps<typeof Input> {}

/** One line of text. Spread `register('name')` of the form into it. */
export const TextField = ({ label, hint, error, isOptional, id, ...input }: TextFieldProps) => (
  <Field {...{ id, label, hint, error, isOptional }}>
    {(aria) => <Input type="text" {...input} {...aria} />}
  </Field>
);

export interface TextAreaProps extends FieldCommon, ComponentProps<typeof Area> {
  /** Markdown and lists of codes are easier to write in a fixed pitch. */
  isFixedPitch?: boolean;
}

/** Several lines of text. */
export const TextArea = ({ label, hint, error, isOptional, id, isFixedPitch, ...area }: TextAreaProps) => (
  <Field {...{ id, label, hint, error, isOptional }}>
    {(aria) => (
      <Area
        rows={6}
        resize="vertical"
        fontFamily={isFixedPitch ? 'mono' : undefined}
        fontSize={isFixedPitch ? 'sm' : undefined}
        {...area}
        {...aria}
      />
    )}
  </Field>
);
