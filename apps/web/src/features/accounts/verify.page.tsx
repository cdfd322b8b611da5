import { verifyTexts } from '../../config/texts/account.js';
import { paths } from '../../config/paths.js';
import { LinkButton } from '../../ui/button.js';
import { Text } from '../../ui/text.js';
import { landing } from './enter.js';
import { ArrivedHeading, EntryPage } from './entry-page.js';
import { MailedLinkState } from './mailed-link-state.js';
import { useMailedToken } from './mailed-token.js';

/** Behind the link that confirms an address. */
export function VerifyPage() {
  const token = useMailedToken('POST /accounts/verify');
  const { session } = token;
  return (
    <EntryPage title={verifyTexts.title}>
      {session?.person ? (
        <>
          <ArrivedHeading level={2}>{verifyTexts.done}</ArrivedHeading>
          <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
            {verifyTexts.doneDetail(session.person.email)}
          </Text>
          <LinkButton to={landing(session)}>
            {landing(session) === paths.shelf.to() ? verifyTexts.toShelf : verifyTexts.toWorkshop}
          </LinkButton>
        </>
      ) : (
        <MailedLinkState token={token} />
      )}
    </EntryPage>
  );
}
