import { Box } from '@chakra-ui/react/box';
import type { InputOf } from '@windchest/contracts';
import { Controller, type UseFormReturn } from 'react-hook-form';
import { kitFormTexts as texts } from '../../config/texts/workshop-kits.js';
import { slugOf } from '../../lib/slug-of.js';
import { TextField } from '../../ui/field/text-field.js';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';
import { ColourField } from './colour-field.js';
import { MarkdownEditor } from '../../ui/markdown-editor.js';

export type KitWords = InputOf<'POST /workshop/kits'>['body'];
export const kitWordNames = ['name', 'slug', 'tagline', 'description', 'colour'] as const;

export interface KitWordsFieldsProps {
  form: UseFormReturn<KitWords, unknown, KitWords>;
  voices?: readonly DrawnVoice[];
  /** A new kit's address follows its name until it is written by hand. */
  isSlugFollowing?: boolean;
}

/** Name, address, tagline, description and colour of a kit. */
export function KitWordsFields({ form, voices, isSlugFollowing }: KitWordsFieldsProps) {
  const { register, control, watch, setValue, formState } = form;
  const { errors, dirtyFields } = formState;
  return (
    <>
      <Box
        display="grid"
        gap="4"
        alignItems="start"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'repeat(2, minmax(0, 1fr))' }}
      >
        <TextField
          label={texts.name}
          hint={texts.kitNameHint}
          error={errors.name}
          {...register('name', {
            onChange: (event: { target: { value: string } }) => {
              if (isSlugFollowing && !dirtyFields.slug) setValue('slug', slugOf(event.target.value));
            },
          })}
        />
        <TextField label={texts.slug} hint={texts.slugHint} error={errors.slug} {...register('slug')} />
      </Box>
      <TextField
        label={texts.tagline}
        hint={texts.taglineHint}
        error={errors.tagline}
        {...register('tagline')}
      />
      <Controller
        control={control}
        name="description"
        render={({ field }) => (
          <MarkdownEditor
            label={texts.description}
            hint={texts.descriptionHint}
            rows={12}
            value={field.value}
            onChange={field.onChange}
            error={errors.description}
          />
        )}
      />
      <ColourField
        chosen={watch('colour')}
        voices={voices?.length ? voices : undefined}
        {...register('colour')}
      />
    </>
  );
}
