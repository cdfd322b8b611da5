import { type RevisionDetail, withdrawalBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { withdrawalTexts as texts } from '../../config/texts/withdrawal.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { TextArea } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';

const formId = 'withdrawal-form';

function WithdrawDialog({ revision, onClose }: { revision: RevisionDetail; onClose: () => void }) {
  const { label, kit } = revision;
  const facts = useEndpoint('GET /workshop/revisions/:revisionId/withdrawal', {
    params: { revisionId: revision.id },
  });
  const { run, fault, isRunning } = useAction('POST /workshop/revisions/:revisionId/withdrawal', [
    'GET /workshop/revisions/:revisionId',
    'GET /workshop/kits/:kitId',
    'GET /workshop/kits',
  ]);
  const [hasOwnWords, setHasOwnWords] = useState(false);
  const { register, handleSubmit, setError, formState } = useForm({
    defaultValues: { reason: '' },
    resolver: formResolver<{ reason: string }, typeof withdrawalBody>(withdrawalBody),
  });
  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { revisionId: revision.id }, body });
    if (outcome.isDone) return onClose();
    setHasOwnWords(showFieldFaults(outcome.fault, ['reason'], setError));
  });
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.title(kit.name, label)}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button
            type="submit"
            form={formId}
            look="stop"
            disabled={!facts.data}
            isBusy={isRunning}
            busyWords={savingTexts.saving}
          >
            {texts.withdraw(label)}
          </Button>
        </>
      }
    >
      <Form id={formId} onSubmit={save}>
        {fault && !hasOwnWords && <Fault what={texts.failed} fault={fault} />}
        {facts.fault && <Fault what={texts.failed} fault={facts.fault} onAgain={() => void facts.mutate()} />}
        {facts.data ? (
          <>
            <Text>
              {facts.data.fallsBackTo
                ? texts.fallsBack(label, facts.data.fallsBackTo)
                : texts.offSale(kit.name, label)}
            </Text>
            <Text fontWeight="semibold">{texts.holders(facts.data.holders)}</Text>
          </>
        ) : (
          <Text isSoft>{texts.counting}</Text>
        )}
        <TextArea
          label={texts.reason}
          hint={texts.reasonHint}
          rows={3}
          maxLength={500}
          error={formState.errors.reason}
          {...register('reason')}
        />
        <Text isSoft>{texts.final}</Text>
      </Form>
    </Dialog>
  );
}

/** Takes a released revision back, after asking. */
export function WithdrawAction({ revision }: { revision: RevisionDetail }) {
  const [isAsking, setIsAsking] = useState(false);
  return (
    <>
      <Button look="outline" aria-haspopup="dialog" onClick={() => setIsAsking(true)}>
        {texts.withdraw(revision.label)}
      </Button>
      {isAsking && <WithdrawDialog revision={revision} onClose={() => setIsAsking(false)} />}
    </>
  );
}
