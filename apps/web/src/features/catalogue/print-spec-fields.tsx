import { Box } from '@chakra-ui/react/box';
import type { FieldErrors, FieldValues, Path, UseFormRegister } from 'react-hook-form';
import { specificationTexts as texts } from '../../config/texts/workshop-specification.js';
import { NumberField } from '../../ui/field/number-field.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import type { PrintSpecForm } from './print-spec-form.js';

const lengths = [
  { name: 'nozzleMm', unit: 'mm' },
  { name: 'layerMm', unit: 'mm' },
] as const;
const counts = ['perimeters', 'topLayers', 'bottomLayers'] as const;

export interface PrintSpecFieldsProps<F extends FieldValues> {
  register: UseFormRegister<F>;
  errors: FieldErrors<PrintSpecForm & { infill: number }> | undefined;
  isDisabled?: boolean;
}

/** The fields of a print specification, registered under `printSpec`. */
export function PrintSpecFields<F extends FieldValues>({
  register,
  errors,
  isDisabled,
}: PrintSpecFieldsProps<F>) {
  const at = (name: keyof PrintSpecForm) => `printSpec.${name}` as Path<F>;
  return (
    <Box
      display="grid"
      gap="3"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(auto-fill, minmax(9.5rem, 1fr))' }}
    >
      {lengths.map(({ name, unit }) => (
        <NumberField
          key={name}
          label={texts.fields[name]}
          unit={unit}
          disabled={isDisabled}
          error={errors?.[name]}
          {...register(at(name), { valueAsNumber: true })}
        />
      ))}
      {counts.map((name) => (
        <NumberField
          key={name}
          label={texts.fields[name]}
          step={1}
          disabled={isDisabled}
          error={errors?.[name]}
          {...register(at(name), { valueAsNumber: true })}
        />
      ))}
      <NumberField
        label={texts.fields.infill}
        unit="%"
        disabled={isDisabled}
        error={errors?.infill ?? errors?.infillPercent}
        {...register(at('infillPercent'), { valueAsNumber: true })}
      />
      <TextField
        label={texts.fields.material}
        placeholder={texts.materialHint}
        disabled={isDisabled}
        error={errors?.material}
        {...register(at('material'))}
      />
      <SelectField
        label={texts.fields.supports}
        disabled={isDisabled}
        options={Object.entries(texts.supports).map(([value, label]) => ({ value, label }))}
        error={errors?.supports}
        {...register(at('supports'))}
      />
      <Box gridColumn="1 / -1">
        <TextField
          label={texts.fields.remarks}
          isOptional
          disabled={isDisabled}
          error={errors?.remarks}
          {...register(at('remarks'))}
        />
      </Box>
    </Box>
  );
}
