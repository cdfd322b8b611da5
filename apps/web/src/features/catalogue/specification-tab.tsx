import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { revisionBody } from '@windchest/contracts';
import { type ReactNode, useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { specificationTexts as texts } from '../../config/texts/workshop-specification.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { NumberField } from '../../ui/field/number-field.js';
import { Form } from '../../ui/form.js';
import { Heading, Text } from '../../ui/text.js';
import { HardwareFields } from './hardware-fields.js';
import { MarkdownEditor, useInserting } from '../../ui/markdown-editor.js';
import { PrintSpecFields } from './print-spec-fields.js';
import { useRevision } from './revision-context.js';
import { specificationBody, type SpecificationForm, specificationForm } from './specification-form.js';
import { usualCautions } from './usual-cautions.js';

const Fields = chakra('fieldset', { base: { border: '0', padding: '0', margin: '0', minWidth: '0' } });

const Section = ({ title, lead, children }: { title: string; lead: string; children: ReactNode }) => (
  <Box as="section" marginBottom="6">
    <Heading level={2} look="subsection">
      {title}
    </Heading>
    <Text isSoft marginTop="0.5" marginBottom="4">
      {lead}
    </Text>
    {children}
  </Box>
);

const threeFields = {
  display: 'grid',
  gap: '3',
  gridTemplateColumns: { base: 'minmax(0, 1fr)', sm: 'repeat(3, minmax(0, 11rem))' },
} as const;

function InsertCautions() {
  const insert = useInserting();
  return (
    <Button look="outline" size="sm" onClick={() => insert.block(usualCautions())}>
      {texts.insertCautions}
    </Button>
  );
}

/** How the kit is printed, what it must fit, how well it must be in tune, what else it takes, what to beware of. */
export function SpecificationTab() {
  const { revision, isWritable } = useRevision();
  const { run, fault, isRunning } = useAction('PATCH /workshop/revisions/:revisionId', [
    'GET /workshop/revisions/:revisionId',
  ]);
  const { register, control, handleSubmit, reset, getValues, formState } = useForm({
    defaultValues: specificationForm(revision),
    resolver: formResolver<SpecificationForm, typeof revisionBody>(revisionBody, specificationBody),
  });
  const { errors, isDirty, isSubmitted } = formState;
  const [isSaved, setIsSaved] = useState(false);
  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { revisionId: revision.id }, body });
    if (outcome.isDone) reset(getValues());
    setIsSaved(outcome.isDone);
  });
  const isFaulty = isSubmitted && Object.keys(errors).length > 0;

  return (
    <Form onSubmit={save}>
      <Fields disabled={!isWritable}>
        <Section title={texts.printing} lead={texts.printingLead}>
          <PrintSpecFields register={register} errors={errors.printSpec as never} />
        </Section>
        <Section title={texts.volume} lead={texts.volumeLead}>
          <Box {...threeFields}>
            {(['xMm', 'yMm', 'zMm'] as const).map((side) => (
              <NumberField
                key={side}
                label={texts[side]}
                unit="mm"
                error={errors.buildVolume?.[side]}
                {...register(`buildVolume.${side}`, { valueAsNumber: true })}
              />
            ))}
          </Box>
        </Section>
        <Section title={texts.tuning} lead={texts.tuningLead}>
          <Box {...threeFields}>
            <NumberField
              label={texts.declaredCents}
              unit={texts.centsUnit}
              error={errors.declaredCents}
              {...register('declaredCents', { valueAsNumber: true })}
            />
            <NumberField
              label={texts.temperature}
              unit="°C"
              error={errors.room?.temperatureC}
              {...register('room.temperatureC', { valueAsNumber: true })}
            />
          </Box>
        </Section>
        <Section title={texts.hardware} lead={texts.hardwareLead}>
          <HardwareFields control={control as never} register={register} errors={errors.hardware} />
        </Section>
        <Section title={texts.cautions} lead={texts.cautionsLead}>
          <Controller
            control={control}
            name="cautions"
            render={({ field }) => (
              <MarkdownEditor
                label={texts.cautions}
                rows={14}
                value={field.value}
                onChange={field.onChange}
                error={errors.cautions}
                tools={<InsertCautions />}
              />
            )}
          />
        </Section>
      </Fields>
      {fault && <Fault what={texts.failed} fault={fault} />}
      {isWritable && (
        <Box display="flex" flexWrap="wrap" alignItems="center" gap="4">
          <Button type="submit" isBusy={isRunning} busyWords={savingTexts.saving}>
            {texts.save}
          </Button>
          <Box role="status" fontSize="sm" color={isFaulty ? 'stop' : 'ink.soft'}>
            {isFaulty ? texts.faulty : isSaved && !isDirty ? savingTexts.saved : ''}
          </Box>
        </Box>
      )}
    </Form>
  );
}
