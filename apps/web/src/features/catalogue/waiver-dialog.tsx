import { type Gate, type RevisionDetail, waiverBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { gateTexts, waiverTexts as texts } from '../../config/texts/workshop-revision.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { TextArea } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';

const formId = 'waiver-form';

export interface WaiverDialogProps {
  revision: RevisionDetail;
  gate: Gate;
  onClose: () => void;
}

/** Waives an open gate, with what it says and the reason why it may be passed all the same. */
export function WaiverDialog({ revision, gate, onClose }: WaiverDialogProps) {
  const { run, fault, isRunning } = useAction('PUT /workshop/revisions/:revisionId/waivers/:gate', [
    'GET /workshop/revisions/:revisionId',
  ]);
  const [hasOwnWords, setHasOwnWords] = useState(false);
  const { register, handleSubmit, setError, formState } = useForm({
    defaultValues: { reason: gate.waiver?.reason ?? '' },
    resolver: formResolver<{ reason: string }, typeof waiverBody>(waiverBody),
  });
  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { revisionId: revision.id, gate: gate.name }, body });
    if (outcome.isDone) return onClose();
    setHasOwnWords(showFieldFaults(outcome.fault, ['reason'], setError));
  });
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.title(gateTexts.names[gate.name])}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button type="submit" form={formId} isBusy={isRunning} busyWords={savingTexts.saving}>
            {texts.waive}
          </Button>
        </>
      }
    >
      <Form id={formId} onSubmit={save}>
        {fault && !hasOwnWords && <Fault what={texts.failed} fault={fault} />}
        <Text fontWeight="semibold">{gate.reason}</Text>
        <Text isSoft>{texts.what(revision.label)}</Text>
        <TextArea
          label={texts.reason}
          hint={texts.reasonHint}
          rows={3}
          maxLength={500}
          error={formState.errors.reason}
          {...register('reason')}
        />
      </Form>
    </Dialog>
  );
}
