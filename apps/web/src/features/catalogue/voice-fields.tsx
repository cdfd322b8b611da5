import { Box } from '@chakra-ui/react/box';
import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { partFormTexts as texts } from '../../config/texts/workshop-parts.js';
import { NumberField } from '../../ui/field/number-field.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { type PartForm, type VoiceKind, voiceKinds, type VoiceMeasure, voiceMeasures } from './part-form.js';

export interface VoiceFieldsProps {
  kind: VoiceKind;
  register: UseFormRegister<PartForm>;
  errors: FieldErrors<PartForm>['voice'];
}

/** What makes the part sound: its kind, its note, and the measures that kind has. */
export function VoiceFields({ kind, register, errors }: VoiceFieldsProps) {
  const measures = voiceMeasures[kind] as readonly { name: VoiceMeasure; isOptional?: boolean }[];
  // A fault inside the list of holes belongs to the one field the list is written in.
  const holesFault = errors?.holes && (errors.holes.message ?? texts.holesRefused);
  return (
    <Box
      display="grid"
      gap="3"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
    >
      <SelectField
        label={texts.kind}
        options={voiceKinds.map((value) => ({ value, label: texts.kinds[value] }))}
        error={errors?.kind}
        {...register('voice.kind')}
      />
      <TextField
        label={texts.note}
        placeholder={texts.noteHint}
        error={errors?.note}
        {...register('voice.note')}
      />
      {measures.map(({ name, isOptional }) => (
        <NumberField
          key={`${kind} ${name}`}
          label={texts.fields[name]}
          unit={texts.units[name]}
          isOptional={isOptional}
          error={errors?.[name]}
          {...register(`voice.${name}`, { valueAsNumber: true })}
        />
      ))}
      {kind === 'vessel' && (
        <TextField
          label={texts.holes}
          hint={texts.holesHint}
          error={holesFault}
          {...register('voice.holes')}
        />
      )}
    </Box>
  );
}
