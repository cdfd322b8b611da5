import { resetBody, type Session } from '@windchest/contracts';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { paths } from '../../config/paths.js';
import { resetTexts, verifyTexts } from '../../config/texts/account.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useHashSecret } from '../../lib/hash-secret.js';
import { useAction } from '../../lib/use-action.js';
import { Button, LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';
import { landing, useEnter } from './enter.js';
import { ArrivedHeading, EntryPage } from './entry-page.js';
import { MailedLinkState } from './mailed-link-state.js';
import { PassphraseField } from './passphrase-field.js';

const closedLinks = ['not-found', 'link-is-used-up', 'link-has-expired'];

/** Behind the link to choose another passphrase, and behind the invitation of staff. */
export function ResetPage() {
  const token = useHashSecret('token');
  const [session, setSession] = useState<Session>();
  const { register, handleSubmit, setError, control, formState } = useForm({
    resolver: formResolver(resetBody.pick({ passphrase: true })),
    defaultValues: { passphrase: '' },
  });
  const written = useWatch({ control, name: 'passphrase' });
  const { run, fault, isRunning, reset } = useAction('POST /accounts/reset');
  const enter = useEnter();
  const choose = handleSubmit(async ({ passphrase }) => {
    if (!token) return;
    const outcome = await run({ body: { token, passphrase } });
    if (outcome.isDone) {
      await enter(outcome.data);
      setSession(outcome.data);
    } else if (showFieldFaults(outcome.fault, ['passphrase'], setError)) reset();
  });

  if (session?.person)
    return (
      <EntryPage title={resetTexts.title}>
        <ArrivedHeading level={2}>{resetTexts.done}</ArrivedHeading>
        <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
          {resetTexts.doneDetail(session.person.email)}
        </Text>
        <LinkButton to={landing(session)}>
          {landing(session) === paths.shelf.to() ? verifyTexts.toShelf : verifyTexts.toWorkshop}
        </LinkButton>
      </EntryPage>
    );
  if (!token || (fault && closedLinks.includes(fault.code)))
    return (
      <EntryPage title={resetTexts.title}>
        <MailedLinkState token={{ hasToken: Boolean(token), fault }} freshAt={paths.forgot.to()} />
      </EntryPage>
    );
  return (
    <EntryPage title={resetTexts.title} lead={resetTexts.lead}>
      <Form onSubmit={choose}>
        <PassphraseField
          label={resetTexts.label}
          written={written}
          error={formState.errors.passphrase}
          {...register('passphrase')}
        />
        {fault && <Fault what={resetTexts.failed} fault={fault} level={2} />}
        <Button type="submit" isBusy={isRunning} busyWords={resetTexts.sending}>
          {resetTexts.send}
        </Button>
      </Form>
    </EntryPage>
  );
}
