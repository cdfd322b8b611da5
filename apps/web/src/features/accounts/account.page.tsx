import { Box } from '@chakra-ui/react/box';
import type { Session } from '@windchest/contracts';
import { useState } from 'react';
import { Navigate, useNavigate } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { accountTexts } from '../../config/texts/account.js';
import { useSession } from '../../lib/session.js';
import { useSignInState } from '../../lib/sign-in-gate.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading } from '../../ui/text.js';
import { PledgeSection } from '../supporters/pledge-section.js';
import { AddressSection } from './address-section.js';
import { useEnter } from './enter.js';
import { LettersSection } from './letters-section.js';
import { NameSection } from './name-section.js';
import { OrdersSection } from './orders-section.js';
import { PassphraseSection } from './passphrase-section.js';
import { PrintersSection } from './printers-section.js';
import { SessionsSection } from './sessions-section.js';

const signedOut = (session: Session): Session => ({ ...session, person: null, permissions: [] });

/** One's own account. */
export function AccountPage() {
  const state = useSignInState();
  const { session, person } = useSession();
  const { fault, mutate } = useEndpoint('GET /session', {});
  const [isLeaving, setIsLeaving] = useState(false);
  const signingOut = useAction('DELETE /session');
  const enter = useEnter();
  const navigate = useNavigate();

  const signOut = async () => {
    setIsLeaving(true);
    if (!(await signingOut.run()).isDone) return setIsLeaving(false);
    await navigate(paths.home.to());
    await enter(session && signedOut(session));
  };

  if (state === 'signed-out' && !isLeaving)
    return <Navigate to={signInThenBack(paths.account.to())} replace />;
  return (
    <Band>
      <PageTitle title={accountTexts.title} />
      <Box
        display="flex"
        flexWrap="wrap"
        gap="4"
        alignItems="center"
        justifyContent="space-between"
        marginBottom="6"
      >
        <Heading level={1}>{accountTexts.title}</Heading>
        {person && (
          <Button look="outline" onClick={signOut} isBusy={isLeaving}>
            {accountTexts.signOut}
          </Button>
        )}
      </Box>
      {signingOut.fault && <Fault what={accountTexts.signOutFailed} fault={signingOut.fault} level={2} />}
      {person ? (
        <>
          <OrdersSection />
          <LettersSection />
          <PrintersSection />
          <PledgeSection />
          <NameSection person={person} />
          <AddressSection person={person} />
          <PassphraseSection />
          <SessionsSection />
        </>
      ) : fault ? (
        <Fault what={accountTexts.notLoaded} fault={fault} level={2} onAgain={() => void mutate()} />
      ) : (
        <SkeletonLines lines={5} />
      )}
    </Band>
  );
}
