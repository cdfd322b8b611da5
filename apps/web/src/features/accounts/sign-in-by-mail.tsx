import { Box } from '@chakra-ui/react/box';
import { useState } from 'react';
import { signInTexts } from '../../config/texts/account.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { Heading, Text } from '../../ui/text.js';

export interface SignInByMailProps {
  /** The address from the form beside it; undefined where it is not one yet. */
  askEmail: () => Promise<string | undefined>;
}

export function SignInByMail({ askEmail }: SignInByMailProps) {
  const [sentTo, setSentTo] = useState<string>();
  const { run, fault, isRunning } = useAction('POST /accounts/sign-in-links');
  const send = async () => {
    setSentTo(undefined);
    const email = await askEmail();
    if (email && (await run({ body: { email } })).isDone) setSentTo(email);
  };
  return (
    <>
      <Heading level={2} look="subsection">
        {signInTexts.byMail}
      </Heading>
      <Text isSoft marginTop="1" marginBottom="4">
        {signInTexts.byMailWhy}
      </Text>
      <Button look="outline" onClick={send} isBusy={isRunning} busyWords={signInTexts.mailing}>
        {signInTexts.mailLink}
      </Button>
      {sentTo && (
        <Box marginTop="5" overflowWrap="anywhere">
          <Notice isNews tone="ok" title={signInTexts.linkSent}>
            {signInTexts.linkSentTo(sentTo)}
          </Notice>
        </Box>
      )}
      {fault && (
        <Box marginTop="5">
          <Fault what={signInTexts.linkFailed} fault={fault} />
        </Box>
      )}
    </>
  );
}
