import { Box } from '@chakra-ui/react/box';
import type { Pledge } from '@windchest/contracts';
import { Navigate, useSearchParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { ownPledgeTexts as texts, pledgeStateTexts } from '../../config/texts/pledge.js';
import { date, price } from '../../lib/format.js';
import { useEndedSession, useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { FilamentSwatch } from '../../ui/drawing/filament-swatch.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { TitleBlock, type TitleBlockField } from '../../ui/title-block.js';
import { EarlierPledges } from './earlier-pledges.js';
import { PledgeActions } from './pledge-actions.js';
import { PledgePayments } from './pledge-payments.js';
import { isLive, leadOf, pledgeSigns, staysWords } from './pledge-words.js';
import { type OwnPledge, useOwnPledge } from './use-own-pledge.js';

function fieldsOf(pledge: Pledge): TitleBlockField[] {
  const day = (moment: string | null) => (moment ? date(moment) : texts.none4);
  const next = pledge.endsAt
    ? { name: texts.blockEnds, value: day(pledge.endsAt) }
    : { name: texts.blockNext, value: day(pledge.nextPaymentAt) };
  return [
    { name: texts.blockPlan, value: pledge.plan.name },
    {
      name: texts.blockState,
      value: <StatusMark state={pledgeSigns[pledge.state]}>{pledgeStateTexts[pledge.state]}</StatusMark>,
    },
    ...(isLive(pledge) ? [next] : []),
    { name: texts.blockPaidUntil, value: day(pledge.paidUntil) },
    {
      name: texts.blockCard,
      value: pledge.cardLast4 ? texts.cardEnding(pledge.cardLast4) : texts.none4,
    },
    { name: texts.blockSince, value: day(pledge.beganAt) },
  ];
}

const Kits = ({ pledge }: { pledge: Pledge }) => (
  <Box as="section" marginTop="8">
    <Heading level={2} look="subsection" marginBottom="2">
      {texts.kits}
    </Heading>
    <Box as="ul" listStyle="none" display="flex" flexWrap="wrap" columnGap="6" rowGap="2">
      {pledge.kits.map((kit) => (
        <KitColour as="li" key={kit.slug} palette={kit.colour} display="flex" gap="2" alignItems="center">
          <FilamentSwatch width="0.75rem" height="1.1em" />
          <TextLink to={paths.shelfKit.to({ slug: kit.slug })}>{kit.name}</TextLink>
        </KitColour>
      ))}
    </Box>
  </Box>
);

function Payments({ pledge }: { pledge: Pledge }) {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('payments')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /pledges/:pledgeId/payments',
    { params: { pledgeId: pledge.id }, query: { page, size: 12 } },
    { keepPreviousData: true },
  );
  return (
    <PledgePayments
      answer={data}
      fault={fault}
      onAgain={() => void mutate()}
      addressOf={(change) => paths.pledge.to({}, { payments: change.page })}
    />
  );
}

const Sheet = ({ pledge, own }: { pledge: Pledge; own: OwnPledge }) => (
  <>
    <SplitSheet
      asideLabel={texts.actions}
      main={
        <>
          <Text isSoft>
            <TextLink to={paths.account.to()}>{texts.toAccount}</TextLink>
          </Text>
          <Heading level={1}>{texts.titles[pledge.state]}</Heading>
          <Text look="lead" color="ink" marginTop="2" role="status">
            {leadOf(pledge)}
          </Text>
          {own.isUnheard && (
            <Text isSoft marginTop="2">
              {texts.notHeard}
            </Text>
          )}
          {pledge.nextPlan && (
            <Box marginTop="4">
              <Notice>
                {texts.nextPlan(
                  pledge.nextPlan.name,
                  price(pledge.nextPlan.amount),
                  date(pledge.nextPlan.from),
                )}
              </Notice>
            </Box>
          )}
          {(pledge.endsAt || !isLive(pledge)) && (
            <Text marginTop="3" isSoft>
              {staysWords(pledge)}
            </Text>
          )}
          {isLive(pledge) && pledge.state !== 'opening' && pledge.kits.length > 0 && <Kits pledge={pledge} />}
        </>
      }
      aside={<PledgeActions pledge={pledge} />}
      block={
        <TitleBlock
          columns={2}
          fields={fieldsOf(pledge)}
          summary={{ name: texts.blockAmount, value: price(pledge.amount) }}
        />
      }
    />
    <Band>
      <Heading level={2} marginBottom="4">
        {texts.payments}
      </Heading>
      <Payments pledge={pledge} />
      <EarlierPledges own={own} current={pledge} />
    </Band>
  </>
);

/** One's own pledge: how it stands, what happens next, and all that can be done with it. */
export function OwnPledgePage() {
  const state = useSignInState();
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const own = useOwnPledge(state === 'signed-in', page);
  useEndedSession(own.fault);
  if (state === 'signed-out') return <Navigate to={signInThenBack(paths.pledge.to())} replace />;
  if (own.pledge)
    return (
      <>
        <PageTitle title={texts.title} />
        <Sheet pledge={own.pledge} own={own} />
      </>
    );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1} marginBottom="6">
        {texts.title}
      </Heading>
      {own.fault ? (
        <Fault level={2} what={texts.failed} fault={own.fault} onAgain={own.reload} />
      ) : own.answer ? (
        <EmptyState
          title={texts.none}
          action={<LinkButton to={paths.support.to()}>{texts.seePlans}</LinkButton>}
        >
          {texts.noneDetail}
        </EmptyState>
      ) : (
        <SkeletonLines lines={5} />
      )}
    </Band>
  );
}
