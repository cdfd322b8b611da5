import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { planBody, type WorkshopPlan } from '@windchest/contracts';
import { useState } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { planFormTexts as texts } from '../../config/texts/workshop-supporters.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import type { Outcome } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { FieldFault, faultText } from '../../ui/field/field.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';
import { MarkdownEditor } from '../../ui/markdown-editor.js';
import { type PlanForm, planBodyOf, planForm } from './plan-form.js';

const Group = chakra('fieldset', { base: { border: '0', padding: '0', margin: '0', minWidth: '0' } });
export type PlanBody = ReturnType<typeof planBody.parse>;
const names = ['name', 'words', 'amountMinor', 'kitIds'] as const;

export interface PlanFieldsProps {
  /** Null makes a new one. */
  plan: WorkshopPlan | null;
  currency: string;
  isWritable: boolean;
  save: (body: PlanBody) => Promise<Outcome<WorkshopPlan>>;
  fault: ApiFault | undefined;
}

/** All of a plan in one form. */
export function PlanFields({ plan, currency, isWritable, save, fault }: PlanFieldsProps) {
  const { data: kits } = useEndpoint('GET /workshop/kits', { query: { size: 100 } });
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const [isSaved, setIsSaved] = useState(false);
  const form = useForm({
    defaultValues: planForm(plan),
    resolver: formResolver<PlanForm, typeof planBody>(planBody, planBodyOf(currency)),
  });
  const { register, handleSubmit, setError, control, formState } = form;
  const scope = useWatch({ control, name: 'scope' });
  const { errors, isSubmitting, isDirty } = formState;
  const submit = handleSubmit(async (body) => {
    const outcome = await save(body);
    setIsSaved(outcome.isDone);
    if (outcome.isDone) form.reset(planForm(outcome.data));
    else setIsFaultBesideField(showFieldFaults(outcome.fault, names, setError));
  });
  const kitsFault = faultText(errors.kitIds as never);

  return (
    <Form onSubmit={submit} gap="7">
      <Group disabled={!isWritable} display="grid" gap="7">
        <Box
          display="grid"
          gap="3"
          alignItems="start"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'minmax(0, 2fr) minmax(0, 1fr)' }}
        >
          <TextField label={texts.name} hint={texts.nameHint} error={errors.name} {...register('name')} />
          <TextField
            label={texts.amount(currency)}
            hint={texts.amountHint}
            inputMode="decimal"
            error={errors.amountMinor}
            {...register('amountMinor')}
          />
        </Box>
        {plan && plan.supporters > 0 && (
          <Text look="small" isSoft marginTop="-4">
            {texts.amountHeld(plan.supporters)}
          </Text>
        )}
        <Controller
          control={control}
          name="words"
          render={({ field }) => (
            <MarkdownEditor
              label={texts.words}
              hint={texts.wordsHint}
              rows={7}
              value={field.value}
              onChange={field.onChange}
              error={errors.words}
            />
          )}
        />
        <Box>
          <RadioRows legend={texts.kits}>
            <RadioRow value="all" label={texts.all} note={texts.allHint} {...register('scope')} />
            <RadioRow value="some" label={texts.some} {...register('scope')} />
          </RadioRows>
          {scope === 'some' && (
            <Box
              role="group"
              aria-label={texts.some}
              display="flex"
              flexWrap="wrap"
              columnGap="6"
              rowGap="1.5"
              marginTop="3"
              marginLeft="1.75rem"
            >
              {kits?.items.map((kit) => (
                <Checkbox key={kit.id} label={kit.name} value={kit.id} {...register('kitIds')} />
              ))}
            </Box>
          )}
          {kitsFault && <FieldFault id="plan-kits-fault">{kitsFault}</FieldFault>}
          <Text look="small" isSoft marginTop="2">
            {texts.kitsHint}
          </Text>
        </Box>
        <Box>
          <RadioRows legend={texts.keeps}>
            {Object.entries(texts.keepsRows).map(([value, { label, note }]) => (
              <RadioRow key={value} value={value} label={label} note={note} {...register('keepsAfter')} />
            ))}
          </RadioRows>
          <Text look="small" isSoft marginTop="2">
            {texts.keepsHint}
          </Text>
        </Box>
        <Checkbox label={texts.isOffered} hint={texts.isOfferedHint} {...register('isOffered')} />
      </Group>
      {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
      {isWritable && (
        <Box display="flex" alignItems="center" gap="4">
          <Button type="submit" isBusy={isSubmitting} busyWords={savingTexts.saving}>
            {plan ? texts.save : texts.make}
          </Button>
          <Box role="status" fontSize="sm" color="ink.soft">
            {isSaved && !isDirty ? savingTexts.saved : ''}
          </Box>
        </Box>
      )}
    </Form>
  );
}
