import { Box } from '@chakra-ui/react/box';
import { sessionEndpoints } from '@windchest/contracts';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { paths } from '../../config/paths.js';
import { accountTexts } from '../../config/texts/account.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { Text } from '../../ui/text.js';
import { AccountSection } from './account-section.js';
import { PassphraseField } from './passphrase-field.js';

export function PassphraseSection() {
  const [isChanged, setIsChanged] = useState(false);
  const form = useForm({
    resolver: formResolver(sessionEndpoints['POST /account/passphrase'].body),
    defaultValues: { current: '', next: '' },
  });
  const { register, handleSubmit, setError, control } = form;
  const { errors } = form.formState;
  const written = useWatch({ control, name: 'next' });
  const { run, fault, isRunning, reset } = useAction('POST /account/passphrase', ['GET /account/sessions']);
  const change = handleSubmit(async (body) => {
    setIsChanged(false);
    const outcome = await run({ body });
    if (outcome.isDone) {
      form.reset();
      setIsChanged(true);
      return;
    }
    const { code, fields } = outcome.fault;
    if (code === 'wrong-credentials') {
      setError('current', { message: accountTexts.currentWrong }, { shouldFocus: true });
      reset();
    } else if (code === 'passphrase-refused') {
      // The server speaks of any passphrase; here it is the new one.
      setError('next', { message: fields['passphrase'] ?? outcome.fault.detail }, { shouldFocus: true });
      reset();
    } else if (showFieldFaults(outcome.fault, ['current', 'next'], setError)) reset();
  });
  return (
    <AccountSection title={accountTexts.passphrase}>
      <Box maxWidth="narrow">
        <Form onSubmit={change}>
          <TextField
            label={accountTexts.current}
            type="password"
            autoComplete="current-password"
            error={errors.current}
            {...register('current')}
          />
          <PassphraseField
            label={accountTexts.next}
            written={written}
            error={errors.next}
            {...register('next')}
          />
          {fault && <Fault what={accountTexts.changeFailed} fault={fault} />}
          {isChanged && (
            <Notice isNews tone="ok">
              {accountTexts.changed}
            </Notice>
          )}
          <Button type="submit" look="outline" isBusy={isRunning} busyWords={accountTexts.changing}>
            {accountTexts.change}
          </Button>
        </Form>
        <Text marginTop="5" isSoft>
          {accountTexts.noCurrent} <TextLink to={paths.forgot.to()}>{accountTexts.resetByMail}</TextLink>
        </Text>
      </Box>
    </AccountSection>
  );
}
