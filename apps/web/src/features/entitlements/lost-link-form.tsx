import { Box } from '@chakra-ui/react/box';
import { emailBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { lostTexts } from '../../config/texts/shelf.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Notice } from '../../ui/notice.js';
import { Heading, Text } from '../../ui/text.js';

/** For those who bought without an account and lost the mail. Says nothing about whether an address ever bought. */
export function LostLinkForm() {
  const [sentTo, setSentTo] = useState<string>();
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: formResolver(emailBody),
    defaultValues: { email: '' },
  });
  const { run, fault, isRunning, reset } = useAction('POST /collect/lost');
  const send = handleSubmit(async (body) => {
    setSentTo(undefined);
    const outcome = await run({ body });
    if (outcome.isDone) setSentTo(body.email);
    else if (showFieldFaults(outcome.fault, ['email'], setError)) reset();
  });
  return (
    <Box as="section" maxWidth="narrow">
      <Heading level={2} look="subsection">
        {lostTexts.title}
      </Heading>
      <Text isSoft marginTop="1" marginBottom="4">
        {lostTexts.why}
      </Text>
      <Form onSubmit={send}>
        <TextField
          label={lostTexts.email}
          type="email"
          autoComplete="email"
          error={formState.errors.email}
          {...register('email')}
        />
        {fault && <Fault what={lostTexts.failed} fault={fault} />}
        {sentTo && (
          <Notice isNews tone="ok" title={lostTexts.sentTitle}>
            <Box overflowWrap="anywhere">{lostTexts.sent(sentTo)}</Box>
          </Notice>
        )}
        <Button type="submit" look="outline" isBusy={isRunning} busyWords={lostTexts.sending}>
          {lostTexts.send}
        </Button>
      </Form>
    </Box>
  );
}
