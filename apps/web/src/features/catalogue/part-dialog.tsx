import { Box } from '@chakra-ui/react/box';
import { type Part, partBody, type RevisionDetail } from '@windchest/contracts';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { partFormTexts as texts } from '../../config/texts/workshop-parts.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { NumberField } from '../../ui/field/number-field.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { DropPart } from './drop-part.js';
import { PartVariants } from './part-variants.js';
import { partBodyOf, type PartForm, partForm } from './part-form.js';
import { PrintSpecFields } from './print-spec-fields.js';
import { staleByParts } from './revision-context.js';
import { VoiceFields } from './voice-fields.js';

const formId = 'part-form';

export interface PartDialogProps {
  revision: RevisionDetail;
  part: Part;
  onClose: () => void;
}

/** Code, name, pieces, orientation, voice, own settings and clearances of one part. */
export function PartDialog({ revision, part, onClose }: PartDialogProps) {
  const { run, fault, isRunning } = useAction(
    'PUT /workshop/revisions/:revisionId/parts/:partId',
    staleByParts,
  );
  const [hasOwnWords, setHasOwnWords] = useState(false);
  const { register, control, handleSubmit, setError, formState } = useForm({
    defaultValues: partForm(part, revision.printSpec),
    resolver: formResolver<PartForm, typeof partBody>(partBody, partBodyOf),
  });
  const { errors } = formState;
  const [isSounding, hasOwnSpec, kind] = useWatch({
    control,
    name: ['isSounding', 'hasOwnSpec', 'voice.kind'],
  });

  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { revisionId: revision.id, partId: part.id }, body });
    if (outcome.isDone) return onClose();
    setHasOwnWords(
      showFieldFaults(outcome.fault, ['code', 'name', 'quantity', 'voice.note', 'voice.lengthMm'], setError),
    );
  });

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.title(part.code)}
      actions={
        <>
          <DropPart revisionId={revision.id} part={part} />
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button type="submit" form={formId} isBusy={isRunning} busyWords={savingTexts.saving}>
            {texts.save}
          </Button>
        </>
      }
    >
      <Form id={formId} onSubmit={save}>
        {fault && !hasOwnWords && <Fault what={texts.failed} fault={fault} />}
        <Box
          display="grid"
          gap="3"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '8rem minmax(0, 1fr)' }}
        >
          <TextField label={texts.code} error={errors.code} {...register('code')} />
          <TextField label={texts.name} error={errors.name} {...register('name')} />
          <Box gridColumn="1 / -1" marginTop="-1.5" fontSize="sm" lineHeight="snug" color="ink.soft">
            {texts.codeHint}
          </Box>
          <NumberField
            label={texts.quantity}
            step={1}
            error={errors.quantity}
            {...register('quantity', { valueAsNumber: true })}
          />
          <SelectField
            label={texts.orientation}
            options={Object.entries(texts.orientations).map(([value, label]) => ({ value, label }))}
            error={errors.orientation}
            {...register('orientation')}
          />
        </Box>
        <Checkbox label={texts.sounds} {...register('isSounding')} />
        {isSounding && <VoiceFields kind={kind} register={register} errors={errors.voice} />}
        <Checkbox label={texts.ownSpec} {...register('hasOwnSpec')} />
        {hasOwnSpec && <PrintSpecFields register={register} errors={errors.printSpec as never} />}
        <Checkbox label={texts.gauge} hint={texts.gaugeHint} {...register('isGauge')} />
      </Form>
      <PartVariants revision={revision} part={part} />
    </Dialog>
  );
}
