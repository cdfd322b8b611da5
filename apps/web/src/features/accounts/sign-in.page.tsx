import { Navigate, useSearchParams } from 'react-router-dom';
import { signInTexts } from '../../config/texts/account.js';
import { useSession } from '../../lib/session.js';
import { PageTitle } from '../../ui/page-title.js';
import { landing } from './enter.js';
import { SignInForm } from './sign-in-form.js';

/** By e-mail and passphrase, or by a mailed link; then back to where one came from. */
export function SignInPage() {
  const { session } = useSession();
  const [search] = useSearchParams();
  const from = search.get('from');
  if (session?.person) return <Navigate to={landing(session, from)} replace />;
  return (
    <>
      <PageTitle title={signInTexts.title} />
      <SignInForm />
    </>
  );
}
