import { type Role, endpoints } from '@windchest/contracts';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { peopleTexts as texts } from '../../config/texts/workshop-people.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';
import { RoleRows } from './role-rows.js';

const formId = 'invite-form';
const staffRoles = ['helper', 'bookkeeper', 'maker', 'owner'] as const satisfies readonly Role[];
const { body: invitation } = endpoints['POST /workshop/invitations'];

export interface InviteDialogProps {
  onClose: () => void;
  onInvited: (email: string) => void;
}

/** Invites somebody to the workshop by e-mail. */
export function InviteDialog({ onClose, onInvited }: InviteDialogProps) {
  const { run, fault, isRunning } = useAction('POST /workshop/invitations', ['GET /workshop/people']);
  const { register, handleSubmit, setError, formState } = useForm({
    defaultValues: { email: '', name: '', role: 'helper' as (typeof staffRoles)[number] },
    resolver: formResolver<
      { email: string; name: string; role: (typeof staffRoles)[number] },
      typeof invitation
    >(invitation),
  });
  const { errors } = formState;
  const send = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) {
      onInvited(body.email);
      onClose();
    } else showFieldFaults(outcome.fault, ['email', 'name'], setError);
  });
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.inviteTitle}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button type="submit" form={formId} isBusy={isRunning} busyWords={savingTexts.saving}>
            {texts.inviteConfirm}
          </Button>
        </>
      }
    >
      <Text isSoft marginBottom="4">
        {texts.inviteLead}
      </Text>
      <Form id={formId} onSubmit={send}>
        {fault && Object.keys(fault.fields).length === 0 && <Fault what={texts.inviteFailed} fault={fault} />}
        <TextField label={texts.email} type="email" error={errors.email} {...register('email')} />
        <TextField label={texts.name} error={errors.name} {...register('name')} />
        <RoleRows roles={staffRoles} {...register('role')} />
      </Form>
    </Dialog>
  );
}
