import type { ShelfKit } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { Navigate, useParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { useEndedSession, useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

export interface ShelfKitAnswerProps {
  /** This page's address, to come back to after signing in. */
  address: (slug: string) => string;
  /** How long until it is asked again, by what stands there now; 0 for never. */
  askAgainMs?: (kit: ShelfKit | undefined) => number;
  children: (kit: ShelfKit) => ReactNode;
}

/** Pages of one kit on the shelf: what stands there until it is here, and where it is not this person's. */
export function ShelfKitAnswer({ address, askAgainMs, children }: ShelfKitAnswerProps) {
  const { slug = '' } = useParams();
  const state = useSignInState();
  const { data, fault, mutate } = useEndpoint(
    'GET /shelf/:slug',
    state === 'signed-in' ? { params: { slug } } : null,
    // SWR looks at the time anew only when it is given another function.
    { refreshInterval: (now) => askAgainMs?.(now) ?? 0 },
  );
  useEndedSession(fault);
  if (state === 'signed-out') return <Navigate to={signInThenBack(address(slug))} replace />;
  if (data) return children(data);
  if (fault?.code === 'not-found')
    return (
      <Band>
        <PageTitle title={shelfKitTexts.notYours} />
        <Heading level={1}>{shelfKitTexts.notYours}</Heading>
        <Text look="lead" marginTop="2" marginBottom="6">
          {shelfKitTexts.notYoursDetail}
        </Text>
        <LinkButton to={paths.shelf.to()}>{shelfKitTexts.toShelf}</LinkButton>
      </Band>
    );
  if (!fault)
    return (
      <Band>
        <SkeletonLines lines={5} />
      </Band>
    );
  return (
    <Band>
      <PageTitle title={shelfKitTexts.failed} />
      <Heading level={1} marginBottom="6">
        {shelfKitTexts.failed}
      </Heading>
      <Fault level={2} fault={fault} onAgain={() => void mutate()} />
    </Band>
  );
}
