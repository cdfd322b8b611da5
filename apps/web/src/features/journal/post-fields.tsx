import { Box } from '@chakra-ui/react/box';
import { Controller, type UseFormReturn } from 'react-hook-form';
import { postFormTexts as texts } from '../../config/texts/workshop-journal.js';
import { slugOf } from '../../lib/slug-of.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextArea, TextField } from '../../ui/field/text-field.js';
import { MarkdownEditor } from '../../ui/markdown-editor.js';
import { InsertPicture } from './insert-picture.js';
import { pictureAddress } from './picture-address.js';
import type { PostWords } from './post-form.js';

const audiences = ['everybody', 'supporters'] as const;

/** The words of a post, whom it is for and what it is about. */
export function PostFields({
  form,
  postId,
}: {
  form: UseFormReturn<PostWords, unknown, PostWords>;
  postId: string | null;
}) {
  const { register, control, setValue, formState } = form;
  const { errors, dirtyFields } = formState;
  const kits = useEndpoint('GET /workshop/kits', { query: { size: 100 } });
  return (
    <>
      <Box
        display="grid"
        gap="4"
        alignItems="start"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'repeat(2, minmax(0, 1fr))' }}
      >
        <TextField
          label={texts.title}
          error={errors.title}
          {...register('title', {
            onChange: (event: { target: { value: string } }) => {
              if (postId === null && !dirtyFields.slug) setValue('slug', slugOf(event.target.value));
            },
          })}
        />
        <TextField label={texts.slug} hint={texts.slugHint} error={errors.slug} {...register('slug')} />
      </Box>
      <TextArea
        label={texts.lead}
        hint={texts.leadHint}
        rows={2}
        maxLength={300}
        error={errors.lead}
        {...register('lead')}
      />
      <Controller
        control={control}
        name="body"
        render={({ field }) => (
          <MarkdownEditor
            label={texts.body}
            hint={texts.bodyHint}
            rows={18}
            value={field.value}
            onChange={field.onChange}
            error={errors.body}
            pictureSrc={pictureAddress}
            tools={<InsertPicture postId={postId} />}
          />
        )}
      />
      <Box maxWidth="44rem" display="grid" gap="4">
        <RadioRows legend={texts.audience} error={errors.audience}>
          {audiences.map((audience) => (
            <RadioRow
              key={audience}
              value={audience}
              {...texts.audiences[audience]}
              {...register('audience')}
            />
          ))}
        </RadioRows>
        <Controller
          control={control}
          name="kitId"
          render={({ field }) => (
            <SelectField
              label={texts.kit}
              emptyLabel={texts.noKit}
              error={errors.kitId}
              value={field.value ?? ''}
              onChange={(event) => field.onChange(event.target.value || null)}
              options={(kits.data?.items ?? []).map(({ id, name }) => ({ value: id, label: name }))}
            />
          )}
        />
      </Box>
    </>
  );
}
