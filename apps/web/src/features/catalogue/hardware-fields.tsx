import { Box } from '@chakra-ui/react/box';
import { type Control, type FieldErrors, useFieldArray, type UseFormRegister } from 'react-hook-form';
import { specificationTexts as texts } from '../../config/texts/workshop-specification.js';
import { Button } from '../../ui/button.js';
import { NumberField } from '../../ui/field/number-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Text } from '../../ui/text.js';
import { emptyHardware, type SpecificationForm } from './specification-form.js';

export interface HardwareFieldsProps {
  // The form hands out a checked body of another type; the field list does not care about it.
  control: Control<SpecificationForm, unknown, never>;
  register: UseFormRegister<SpecificationForm>;
  errors: FieldErrors<SpecificationForm>['hardware'];
}

/** What is not printed, a row for each thing. */
export function HardwareFields({ control, register, errors }: HardwareFieldsProps) {
  const { fields, append, remove } = useFieldArray({ control, name: 'hardware' });
  return (
    <Box>
      {fields.length === 0 && <Text isSoft>{texts.noHardware}</Text>}
      {fields.map((field, at) => (
        <Box
          key={field.id}
          role="group"
          aria-label={texts.rowOf(at + 1)}
          display="grid"
          gap="3"
          alignItems="start"
          paddingBlock="3"
          borderBottomWidth="1px"
          borderColor="hairline"
          gridTemplateColumns={{
            base: 'repeat(2, minmax(0, 1fr))',
            md: '6rem 7rem minmax(0, 1fr) minmax(0, 1fr) auto',
          }}
        >
          <NumberField
            label={texts.quantity}
            error={errors?.[at]?.quantity}
            {...register(`hardware.${at}.quantity`, { valueAsNumber: true })}
          />
          <TextField
            label={texts.unit}
            placeholder="m"
            error={errors?.[at]?.unit}
            {...register(`hardware.${at}.unit`)}
          />
          <Box gridColumn={{ base: '1 / -1', md: 'auto' }}>
            <TextField label={texts.item} error={errors?.[at]?.name} {...register(`hardware.${at}.name`)} />
          </Box>
          <Box gridColumn={{ base: '1 / -1', md: 'auto' }}>
            <TextField
              label={texts.remark}
              error={errors?.[at]?.remark}
              {...register(`hardware.${at}.remark`)}
            />
          </Box>
          <Button
            look="plain"
            marginTop={{ md: '6' }}
            justifySelf="start"
            aria-label={texts.removeRow(at + 1)}
            onClick={() => remove(at)}
          >
            {texts.remove}
          </Button>
        </Box>
      ))}
      <Button look="outline" size="sm" marginTop="4" onClick={() => append(emptyHardware)}>
        {texts.addRow}
      </Button>
    </Box>
  );
}
