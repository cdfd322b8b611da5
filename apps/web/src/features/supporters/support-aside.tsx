import { Box } from '@chakra-ui/react/box';
import type { Plan, Pledge } from '@windchest/contracts';
import { lazy, type ReactNode, Suspense } from 'react';
import { paths, signInThenBack } from '../../config/paths.js';
import { supportTexts as texts } from '../../config/texts/pledge.js';
import { useSession } from '../../lib/session.js';
import { AnchorButton, LinkButton } from '../../ui/button.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

// The form brings its schema and the reader of it along.
const PledgeForm = lazy(async () => ({ default: (await import('./pledge-form.js')).PledgeForm }));

const Way = ({ title, why, children }: { title: string; why: string; children: ReactNode }) => (
  <>
    <Heading level={2} look="subsection">
      {title}
    </Heading>
    <Text marginTop="1" marginBottom="5">
      {why}
    </Text>
    <Box display="flex" flexWrap="wrap" gap="3">
      {children}
    </Box>
  </>
);

export interface SupportAsideProps {
  formId: string;
  plan: Plan | undefined;
  /** A pledge that stands already; undefined while nobody knows. */
  standing: Pledge | null | undefined;
  onOpening: (isOpening: boolean) => void;
}

/** What one can do about the chosen plan: sign in, confirm the address, open the pledge one has, or begin one. */
export function SupportAside({ formId, plan, standing, onOpening }: SupportAsideProps) {
  const { session, person } = useSession();
  if (!session) return <SkeletonLines lines={6} />;
  if (!person)
    return (
      <Way title={texts.signIn} why={texts.signInWhy}>
        <LinkButton to={signInThenBack(paths.support.to({}, { plan: plan?.id }))}>{texts.signIn}</LinkButton>
        <LinkButton look="outline" to={paths.join.to()}>
          {texts.join}
        </LinkButton>
      </Way>
    );
  if (!person.isVerified)
    return (
      <Way title={texts.verify} why={texts.verifyWhy}>
        <LinkButton look="outline" to={paths.account.to()}>
          {texts.toAccount}
        </LinkButton>
      </Way>
    );
  if (standing === undefined) return <SkeletonLines lines={6} />;
  if (standing && standing.state !== 'opening')
    return (
      <Way title={texts.youPledge(standing.plan.name)} why={texts.youPledgeWhy}>
        <LinkButton to={paths.pledge.to()}>{texts.openPledge}</LinkButton>
      </Way>
    );
  return (
    <Box display="grid" gap="8">
      {standing?.paymentUrl && (
        <Box>
          <Way title={texts.waits(standing.plan.name)} why={texts.waitsWhy}>
            <AnchorButton look="outline" href={standing.paymentUrl}>
              {texts.goOn}
            </AnchorButton>
          </Way>
        </Box>
      )}
      {plan && (
        <Box>
          <Heading level={2} look="subsection" marginBottom="5">
            {texts.aside}
          </Heading>
          <Suspense fallback={<SkeletonLines lines={6} />}>
            <PledgeForm id={formId} plan={plan} onOpening={onOpening} />
          </Suspense>
        </Box>
      )}
    </Box>
  );
}
