import { Box } from '@chakra-ui/react/box';
import type { LetterChoices } from '@windchest/contracts';
import { Controller, type UseFormReturn } from 'react-hook-form';
import { letterFormTexts as texts } from '../../config/texts/workshop-letters.js';
import { millimetres } from '../../lib/format.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import type { LetterForm } from './letter-form.js';
import { TickGroup } from './tick-group.js';

const sources = ['purchase', 'pledge', 'gift', 'staff'] as const;
const countryName = new Intl.DisplayNames('en', { type: 'region' });

export interface AudienceFieldsProps {
  form: UseFormReturn<LetterForm, unknown, LetterForm>;
  choices: LetterChoices;
}

/** The facts a reader must fit. */
export function AudienceFields({ form, choices }: AudienceFieldsProps) {
  const { register, control, watch } = form;
  const [kitId, kind, ownsKit] = watch(['kitId', 'kind', 'audience.ownsKit']);
  const kit = choices.kits.find(({ id }) => id === kitId);
  const revisionOptions = (kit?.revisions ?? []).map(({ id, label }) => ({ value: id, label }));
  const held = (name: 'audience.heldFromId' | 'audience.heldToId', label: string) => (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <SelectField
          label={label}
          emptyLabel={texts.any}
          value={field.value ?? ''}
          onChange={(event) => field.onChange(event.target.value || null)}
          options={revisionOptions}
        />
      )}
    />
  );
  const ticks = <T extends string | number>(
    name:
      | 'audience.sources'
      | 'audience.materials'
      | 'audience.nozzlesMm'
      | 'audience.reportedParts'
      | 'audience.countries',
    legend: string,
    options: { value: T; label: string }[],
  ) => (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <TickGroup
          legend={legend}
          options={options}
          chosen={field.value as unknown as T[]}
          onChange={field.onChange}
        />
      )}
    />
  );
  return (
    <Box display="grid" gap="5">
      {kit && (
        <Box display="grid" gap="3">
          <Checkbox label={texts.ownsKit} {...register('audience.ownsKit')} />
          {ownsKit && (
            <>
              <Checkbox
                label={texts.leavesOut}
                hint={texts.leavesOutHint}
                {...register('leavesOutUnneeded')}
              />
              <Box
                display="grid"
                gap="3"
                gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
              >
                {held('audience.heldFromId', texts.heldFrom)}
                {held('audience.heldToId', texts.heldTo)}
              </Box>
              <Checkbox label={texts.withNothingHeld} {...register('audience.withNothingHeld')} />
            </>
          )}
        </Box>
      )}
      {kind === 'service' && <Checkbox label={texts.askedForNews} {...register('audience.askedForNews')} />}
      {ticks(
        'audience.sources',
        texts.sources,
        sources.map((value) => ({ value, label: texts.sourceNames[value] })),
      )}
      {kit &&
        ticks(
          'audience.reportedParts',
          texts.parts,
          kit.reportedParts.map((value) => ({ value, label: value })),
        )}
      {ticks(
        'audience.materials',
        texts.materials,
        choices.materials.map((value) => ({ value, label: value })),
      )}
      {ticks(
        'audience.nozzlesMm',
        texts.nozzles,
        choices.nozzlesMm.map((value) => ({ value, label: millimetres(value, 2) })),
      )}
      {ticks(
        'audience.countries',
        texts.countries,
        choices.countries.map((value) => ({ value, label: countryName.of(value) ?? value })),
      )}
    </Box>
  );
}
