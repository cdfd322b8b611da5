import { Box } from '@chakra-ui/react/box';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { supportTexts as texts } from '../../config/texts/pledge.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button, LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { PlanRows } from './plan-rows.js';
import { SupportAside } from './support-aside.js';
import { standingPledge } from './use-pledging.js';

const formId = 'pledge';

const Head = () => (
  <>
    <Heading level={1}>{texts.title}</Heading>
    <Text look="lead" marginTop="2" marginBottom="6">
      {texts.lead}
    </Text>
  </>
);

/** What one can pledge each month, and the way to begin. */
export function SupportPage() {
  const [address, setAddress] = useSearchParams();
  const { person } = useSession();
  const page = Math.max(1, Number(address.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint('GET /plans', { query: { page } }, { keepPreviousData: true });
  const own = useEndpoint('GET /account/pledges', person ? { query: {} } : null);
  const [isOpening, setIsOpening] = useState(false);

  if (!data || data.total === 0)
    return (
      <Band>
        <PageTitle title={texts.title} />
        <Head />
        {fault ? (
          <Fault level={2} what={texts.failed} fault={fault} onAgain={() => void mutate()} />
        ) : data ? (
          <EmptyState
            title={texts.empty}
            action={<LinkButton to={paths.home.to()}>{texts.seeKits}</LinkButton>}
          >
            {texts.emptyDetail}
          </EmptyState>
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );

  const plan = data.items.find(({ id }) => id === address.get('plan')) ?? data.items[0];
  const standing = own.data ? (standingPledge(own.data.items) ?? null) : undefined;
  const isPledging = standing !== undefined && standing !== null && standing.state !== 'opening';
  const isFormShown = Boolean(person?.isVerified) && standing !== undefined && !isPledging;
  return (
    <>
      <PageTitle title={texts.title} />
      <SplitSheet
        asideLabel={texts.aside}
        main={
          <>
            <Head />
            <PlanRows
              plans={data.items}
              chosenId={plan?.id}
              onChoose={(id) =>
                setAddress(
                  (before) => {
                    before.set('plan', id);
                    return before;
                  },
                  { replace: true, preventScrollReset: true },
                )
              }
            />
            <Box marginTop="3">
              <Pager
                page={data.page}
                size={data.size}
                total={data.total}
                addressOf={(change) => paths.support.to({}, change)}
              />
            </Box>
          </>
        }
        aside={<SupportAside formId={formId} plan={plan} standing={standing} onOpening={setIsOpening} />}
        block={
          plan && (
            <TitleBlock
              columns={2}
              fields={[
                { name: texts.blockPlan, value: plan.name },
                { name: texts.blockKits, value: number(plan.kits.length) },
              ]}
              summary={{ name: texts.blockAmount, value: price(plan.amount) }}
              action={
                isFormShown && (
                  <Button
                    look="cell"
                    type="submit"
                    form={formId}
                    isBusy={isOpening}
                    busyWords={texts.opening}
                  >
                    {texts.open(price(plan.amount))}
                  </Button>
                )
              }
            />
          )
        }
      />
    </>
  );
}
