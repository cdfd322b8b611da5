import { emailBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { paths } from '../../config/paths.js';
import { forgotTexts } from '../../config/texts/account.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { Text } from '../../ui/text.js';
import { ArrivedHeading, EntryPage } from './entry-page.js';

/** Asks for a link by which another passphrase is chosen. */
export function ForgotPage() {
  const [sentTo, setSentTo] = useState<string>();
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: formResolver(emailBody),
    defaultValues: { email: '' },
  });
  const { run, fault, isRunning, reset } = useAction('POST /accounts/forgotten');
  const send = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) setSentTo(body.email);
    else if (showFieldFaults(outcome.fault, ['email'], setError)) reset();
  });

  if (sentTo)
    return (
      <EntryPage title={forgotTexts.title}>
        <ArrivedHeading level={2}>{forgotTexts.sentTitle}</ArrivedHeading>
        <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
          {forgotTexts.sent(sentTo)}
        </Text>
        <Button look="outline" onClick={() => setSentTo(undefined)}>
          {forgotTexts.again}
        </Button>
      </EntryPage>
    );
  return (
    <EntryPage title={forgotTexts.title} lead={forgotTexts.lead}>
      <Form onSubmit={send}>
        <TextField
          label={forgotTexts.email}
          type="email"
          autoComplete="username"
          error={formState.errors.email}
          {...register('email')}
        />
        {fault && <Fault what={forgotTexts.failed} fault={fault} level={2} />}
        <Button type="submit" isBusy={isRunning} busyWords={forgotTexts.sending}>
          {forgotTexts.send}
        </Button>
      </Form>
      <Text marginTop="6">
        <TextLink to={paths.signIn.to()}>{forgotTexts.back}</TextLink>
      </Text>
    </EntryPage>
  );
}
