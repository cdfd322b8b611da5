import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ComponentProps, type ReactNode, useId } from 'react';
import { VisuallyHidden } from '../visually-hidden.js';
import { FieldFault, faultText, type FieldCommon } from './field.js';
import { RadioInput } from './tick.js';

export interface RadioRowsProps {
  legend: string;
  /** Seen by default; hidden where the heading above says it already. */
  isLegendHidden?: boolean;
  error?: FieldCommon['error'];
  children: ReactNode;
}

/** A set of RadioRow, ruled by hairlines. */
export function RadioRows({ legend, isLegendHidden, error, children }: RadioRowsProps) {
  const id = useId();
  const fault = faultText(error);
  return (
    <chakra.fieldset aria-describedby={fault && `${id}-fault`} border="0" padding="0" margin="0" minWidth="0">
      {isLegendHidden ? (
        <VisuallyHidden as="legend">{legend}</VisuallyHidden>
      ) : (
        <Box as="legend" fontSize="sm" fontWeight="semibold" marginBottom="1.5">
          {legend}
        </Box>
      )}
      <Box borderTopWidth="1px" borderColor="hairline">
        {children}
      </Box>
      {fault && <FieldFault id={`${id}-fault`}>{fault}</FieldFault>}
    </chakra.fieldset>
  );
}

export interface RadioRowProps extends ComponentProps<typeof RadioInput> {
  label: ReactNode;
  /** A line under the label. */
  note?: ReactNode;
  /** At the right end: a price. */
  worth?: ReactNode;
}

/** One choice. Spread `register('licenceId')` and give its `value`. */
export const RadioRow = ({ label, note, worth, ...input }: RadioRowProps) => (
  <Box
    as="label"
    display="flex"
    gap="2.5"
    alignItems="flex-start"
    paddingBlock="2.5"
    borderBottomWidth="1px"
    borderColor="hairline"
    cursor="pointer"
    css={{ '&:has(:disabled)': { color: 'ink.soft', cursor: 'not-allowed' } }}
  >
    <RadioInput {...input} />
    <Box flex="1" minWidth="0">
      {label}
      {note && (
        <Box fontSize="sm" lineHeight="snug" color="ink.soft">
          {note}
        </Box>
      )}
    </Box>
    {worth && (
      <Box fontWeight="semibold" whiteSpace="nowrap">
        {worth}
      </Box>
    )}
  </Box>
);
