import { Box } from '@chakra-ui/react/box';
import type { LetterChoices } from '@windchest/contracts';
import { Controller, type UseFormReturn } from 'react-hook-form';
import { letterFormTexts as texts } from '../../config/texts/workshop-letters.js';
import { NumberField } from '../../ui/field/number-field.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { MarkdownEditor } from '../../ui/markdown-editor.js';
import { InsertField } from './insert-field.js';
import type { LetterForm } from './letter-form.js';

export interface LetterFieldsProps {
  form: UseFormReturn<LetterForm, unknown, LetterForm>;
  choices: LetterChoices;
}

/** What a letter is, what it is about, and its words. */
export function LetterFields({ form, choices }: LetterFieldsProps) {
  const { register, control, setValue, watch, formState } = form;
  const { errors } = formState;
  const kitId = watch('kitId');
  const kit = choices.kits.find(({ id }) => id === kitId);
  return (
    <>
      <Box
        display="grid"
        gap="6"
        alignItems="start"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'repeat(2, minmax(0, 1fr))' }}
      >
        <RadioRows legend={texts.kind} error={errors.kind}>
          {(['service', 'news'] as const).map((kind) => (
            <RadioRow key={kind} value={kind} {...texts.kinds[kind]} {...register('kind')} />
          ))}
        </RadioRows>
        <Box display="grid" gap="4">
          <Controller
            control={control}
            name="kitId"
            render={({ field }) => (
              <SelectField
                label={texts.kit}
                emptyLabel={texts.noKit}
                error={errors.kitId}
                value={field.value ?? ''}
                onChange={(event) => {
                  field.onChange(event.target.value || null);
                  setValue('revisionId', null);
                  setValue('audience.heldFromId', null);
                  setValue('audience.heldToId', null);
                  setValue('audience.reportedParts', []);
                }}
                options={choices.kits.map(({ id, name }) => ({ value: id, label: name }))}
              />
            )}
          />
          {kit && (
            <Controller
              control={control}
              name="revisionId"
              render={({ field }) => (
                <SelectField
                  label={texts.revision}
                  emptyLabel={texts.newest}
                  error={errors.revisionId}
                  value={field.value ?? ''}
                  onChange={(event) => field.onChange(event.target.value || null)}
                  options={kit.revisions.map(({ id, label }) => ({ value: id, label }))}
                />
              )}
            />
          )}
          <NumberField
            label={texts.pace}
            hint={texts.paceHint}
            error={errors.perMinute}
            step={1}
            {...register('perMinute', { valueAsNumber: true })}
          />
        </Box>
      </Box>
      <TextField label={texts.subject} error={errors.subject} maxLength={150} {...register('subject')} />
      <Controller
        control={control}
        name="body"
        render={({ field }) => (
          <MarkdownEditor
            label={texts.body}
            hint={texts.bodyHint}
            rows={14}
            value={field.value}
            onChange={field.onChange}
            error={errors.body}
            tools={<InsertField />}
          />
        )}
      />
    </>
  );
}
