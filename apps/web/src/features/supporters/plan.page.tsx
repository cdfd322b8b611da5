import { Box } from '@chakra-ui/react/box';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { planFormTexts as texts, plansTexts } from '../../config/texts/workshop-supporters.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Progress } from '../../ui/progress.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { PlanFields } from './plan-fields.js';

/** One plan: its form, and beside it what it brings in. */
export function PlanPage() {
  const { planId = '' } = useParams();
  const { session, may } = useSession();
  const {
    data: plan,
    fault: readFault,
    mutate,
  } = useEndpoint(
    'GET /workshop/plans/:planId',
    { params: { planId } },
    { refreshInterval: (one) => (one && !one.areShelvesUpToDate ? 1500 : 0) },
  );
  const { run, fault } = useAction('PUT /workshop/plans/:planId', [
    'GET /workshop/plans',
    'GET /workshop/plans/:planId',
    'GET /plans',
  ]);
  if (!plan || !session)
    return (
      <Band>
        {readFault ? (
          <Fault what={texts.notFound} fault={readFault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  return (
    <>
      <PageTitle title={plan.name} />
      <SplitSheet
        asideLabel={texts.standing}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.plans.to()}>{plansTexts.caption}</TextLink>
            </Text>
            <Heading level={1} marginBottom="6" overflowWrap="anywhere">
              {plan.name}{' '}
              <Box as="span" fontWeight="normal" color="ink.soft">
                {plan.isOffered ? plansTexts.offered : plansTexts.notOffered}
              </Box>
            </Heading>
            <PlanFields
              key={plan.id}
              plan={plan}
              currency={session.workshop.currency}
              isWritable={may('plans:write')}
              fault={fault}
              save={(body) => run({ params: { planId }, body })}
            />
          </>
        }
        aside={
          <Box display="grid" gap="4">
            <Heading level={2} look="subsection">
              {texts.standing}
            </Heading>
            {!plan.areShelvesUpToDate && <Progress label={texts.following} />}
            <Text>
              <TextLink to={paths.workshop.supporters.to({}, { planId: plan.id })}>
                {texts.toSupporters}
              </TextLink>
            </Text>
            {plan.isOffered && (
              <Text>
                <TextLink to={paths.support.to({}, { plan: plan.id })}>{texts.toPage}</TextLink>
              </Text>
            )}
          </Box>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[{ name: texts.supporters, value: number(plan.supporters) }]}
            summary={{ name: texts.monthly, value: price(plan.monthly) }}
          />
        }
      />
    </>
  );
}
