import { Navigate } from 'react-router-dom';
import { signInLinkTexts } from '../../config/texts/account.js';
import { useSession } from '../../lib/session.js';
import { landing } from './enter.js';
import { EntryPage } from './entry-page.js';
import { MailedLinkState } from './mailed-link-state.js';
import { useMailedToken } from './mailed-token.js';

/** Behind the link that signs in once. */
export function SignInLinkPage() {
  const token = useMailedToken('POST /session/from-link');
  const { session: present, isSignedIn } = useSession();
  const session = token.session ?? (isSignedIn && !token.hasToken ? present : undefined);
  if (session) return <Navigate to={landing(session)} replace />;
  return (
    <EntryPage title={signInLinkTexts.title}>
      <MailedLinkState token={token} />
    </EntryPage>
  );
}
