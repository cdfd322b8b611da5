import { Box } from '@chakra-ui/react/box';
import { signInBody } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { paths } from '../../config/paths.js';
import { signInTexts } from '../../config/texts/account.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { SplitSheet } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { useEnter } from './enter.js';
import { SignInByMail } from './sign-in-by-mail.js';

/** The passphrase's form and the way by mail share the e-mail field. */
export function SignInForm() {
  const form = useForm({ resolver: formResolver(signInBody), defaultValues: { email: '', passphrase: '' } });
  const { register, handleSubmit, setError } = form;
  const { errors } = form.formState;
  const { run, fault, isRunning, reset } = useAction('POST /session');
  const enter = useEnter();
  const signIn = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) await enter(outcome.data);
    else if (showFieldFaults(outcome.fault, ['email', 'passphrase'], setError)) reset();
  });
  const askEmail = async () =>
    (await form.trigger('email', { shouldFocus: true })) ? form.getValues('email').trim() : undefined;

  return (
    <SplitSheet
      asideLabel={signInTexts.byMail}
      main={
        <>
          <Heading level={1} marginBottom="6">
            {signInTexts.title}
          </Heading>
          <Box maxWidth="narrow">
            <Form onSubmit={signIn}>
              <TextField
                label={signInTexts.email}
                type="email"
                autoComplete="username"
                error={errors.email}
                {...register('email')}
              />
              <TextField
                label={signInTexts.passphrase}
                type="password"
                autoComplete="current-password"
                error={errors.passphrase}
                {...register('passphrase')}
              />
              {fault && <SignInFault fault={fault} />}
              <Box display="flex" flexWrap="wrap" alignItems="center" columnGap="5" rowGap="3">
                <Button type="submit" isBusy={isRunning} busyWords={signInTexts.sending}>
                  {signInTexts.send}
                </Button>
                <TextLink to={paths.forgot.to()}>{signInTexts.forgot}</TextLink>
              </Box>
            </Form>
          </Box>
        </>
      }
      aside={
        <>
          <SignInByMail askEmail={askEmail} />
          <Box as="ul" listStyle="none" marginTop="8" borderTopWidth="1px" borderColor="hairline">
            <Row>
              {signInTexts.newHere} <TextLink to={paths.join.to()}>{signInTexts.join}</TextLink>
            </Row>
            <Row>
              {signInTexts.guest} <TextLink to={paths.shelf.to()}>{signInTexts.lost}</TextLink>
            </Row>
          </Box>
        </>
      }
    />
  );
}

/** A wrong passphrase is no fault of the shop: nobody has to write to the workshop about it. */
const SignInFault = ({ fault }: { fault: ApiFault }) =>
  fault.code === 'wrong-credentials' ? (
    <Fault level={2} fault={{ title: signInTexts.failed, detail: fault.detail }} />
  ) : (
    <Fault level={2} what={signInTexts.failed} fault={fault} />
  );

const Row = ({ children }: { children: ReactNode }) => (
  <Text as="li" paddingBlock="2.5" borderBottomWidth="1px" borderColor="hairline">
    {children}
  </Text>
);
