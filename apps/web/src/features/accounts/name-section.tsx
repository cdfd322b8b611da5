import { Box } from '@chakra-ui/react/box';
import { type Person, sessionEndpoints } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { accountTexts } from '../../config/texts/account.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Notice } from '../../ui/notice.js';
import { AccountSection } from './account-section.js';

export function NameSection({ person }: { person: Person }) {
  const { replace } = useSession();
  const [isSaved, setIsSaved] = useState(false);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: formResolver(sessionEndpoints['PATCH /account'].body),
    values: { name: person.name },
    resetOptions: { keepDirtyValues: true },
  });
  const { run, fault, isRunning, reset } = useAction('PATCH /account');
  const save = handleSubmit(async (body) => {
    setIsSaved(false);
    const outcome = await run({ body });
    if (outcome.isDone) {
      await replace(outcome.data);
      setIsSaved(true);
    } else if (showFieldFaults(outcome.fault, ['name'], setError)) reset();
  });
  return (
    <AccountSection title={accountTexts.name}>
      <Box maxWidth="narrow">
        <Form onSubmit={save}>
          <TextField
            label={accountTexts.name}
            autoComplete="name"
            error={formState.errors.name}
            {...register('name')}
          />
          {fault && <Fault what={accountTexts.nameFailed} fault={fault} />}
          {isSaved && (
            <Notice isNews tone="ok">
              {accountTexts.nameSaved}
            </Notice>
          )}
          <Button type="submit" look="outline" isBusy={isRunning}>
            {accountTexts.saveName}
          </Button>
        </Form>
      </Box>
    </AccountSection>
  );
}
