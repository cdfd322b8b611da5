import { Box } from '@chakra-ui/react/box';
import { useRef, useState } from 'react';
import { Navigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { joinTexts } from '../../config/texts/account.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { SplitSheet } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { ArrivedHeading } from './entry-page.js';
import { JoinForm } from './join-form.js';

/** The same words whether or not the address has an account: only its owner hears of it, by mail. */
const Sent = ({ email, onBack }: { email: string; onBack: () => void }) => (
  <>
    <ArrivedHeading level={1}>{joinTexts.sentTitle}</ArrivedHeading>
    <Text look="lead" marginTop="2" overflowWrap="anywhere">
      {joinTexts.sent(email)}
    </Text>
    <Text marginTop="5" marginBottom="4">
      {joinTexts.notCome}
    </Text>
    <Button look="outline" onClick={onBack}>
      {joinTexts.again}
    </Button>
  </>
);

const Uses = () => (
  <>
    <Heading level={2} look="subsection" marginBottom="3">
      {joinTexts.whatFor}
    </Heading>
    <Box as="ul" listStyle="none" borderTopWidth="1px" borderColor="hairline">
      {joinTexts.uses.map((use) => (
        <Box as="li" key={use} paddingBlock="2.5" borderBottomWidth="1px" borderColor="hairline">
          {use}
        </Box>
      ))}
    </Box>
    <Text marginTop="6">
      {joinTexts.haveOne} <TextLink to={paths.signIn.to()}>{joinTexts.signIn}</TextLink>
    </Text>
  </>
);

export function JoinPage() {
  const { isSignedIn } = useSession();
  const [sentTo, setSentTo] = useState<string>();
  const form = useRef<HTMLDivElement>(null);
  const back = () => {
    setSentTo(undefined);
    // The button that was pressed is gone, and the form stands only after the next painting.
    requestAnimationFrame(() => form.current?.querySelector('input')?.focus());
  };
  if (isSignedIn) return <Navigate to={paths.account.to()} replace />;
  return (
    <SplitSheet
      asideLabel={joinTexts.whatFor}
      main={
        <>
          <PageTitle title={joinTexts.title} />
          {sentTo && <Sent email={sentTo} onBack={back} />}
          {/* Kept, so that nothing typed is lost where the address was wrong. */}
          <Box ref={form} display={sentTo ? 'none' : undefined}>
            {!sentTo && <Heading level={1}>{joinTexts.title}</Heading>}
            <Text look="lead" marginTop="2" marginBottom="6">
              {joinTexts.lead}
            </Text>
            <Box maxWidth="narrow">
              <JoinForm onSent={setSentTo} />
            </Box>
          </Box>
        </>
      }
      aside={<Uses />}
    />
  );
}
