import { joinBody } from '@windchest/contracts';
import { useForm, useWatch } from 'react-hook-form';
import { joinTexts, passphraseTexts } from '../../config/texts/account.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { PassphraseField } from './passphrase-field.js';

export function JoinForm({ onSent }: { onSent: (email: string) => void }) {
  const { register, handleSubmit, setError, control, formState } = useForm({
    resolver: formResolver(joinBody),
    defaultValues: { email: '', name: '', passphrase: '' },
  });
  const { errors } = formState;
  const written = useWatch({ control, name: 'passphrase' });
  const { run, fault, isRunning, reset } = useAction('POST /accounts');
  const join = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) onSent(body.email);
    else if (showFieldFaults(outcome.fault, ['email', 'name', 'passphrase'], setError)) reset();
  });
  return (
    <Form onSubmit={join}>
      <TextField
        label={joinTexts.email}
        type="email"
        autoComplete="email"
        error={errors.email}
        {...register('email')}
      />
      <TextField
        label={joinTexts.name}
        hint={joinTexts.nameHint}
        autoComplete="name"
        error={errors.name}
        {...register('name')}
      />
      <PassphraseField
        label={passphraseTexts.label}
        written={written}
        error={errors.passphrase}
        {...register('passphrase')}
      />
      {fault && <Fault what={joinTexts.failed} fault={fault} level={2} />}
      <Button type="submit" isBusy={isRunning} busyWords={joinTexts.sending}>
        {joinTexts.send}
      </Button>
    </Form>
  );
}
