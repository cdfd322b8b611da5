import { Box } from '@chakra-ui/react/box';
import { useSearchParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { shelfTexts } from '../../config/texts/shelf.js';
import { useEndedSession, useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading, Text } from '../../ui/text.js';
import { LostLinkForm } from './lost-link-form.js';
import { ShelfRow } from './shelf-row.js';

const SignedOut = () => (
  <SplitSheet
    main={
      <>
        <Heading level={1}>{shelfTexts.title}</Heading>
        <Text look="lead" marginTop="2" marginBottom="6">
          {shelfTexts.signedOutLead}
        </Text>
        <Box display="flex" flexWrap="wrap" gap="3">
          <LinkButton to={signInThenBack(paths.shelf.to())}>{shelfTexts.signIn}</LinkButton>
          <LinkButton look="outline" to={paths.join.to()}>
            {shelfTexts.join}
          </LinkButton>
        </Box>
      </>
    }
    aside={<LostLinkForm />}
  />
);

function Kits() {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint('GET /shelf', { query: { page } }, { keepPreviousData: true });
  useEndedSession(fault);
  if (fault && !data)
    return <Fault level={2} what={shelfTexts.failed} fault={fault} onAgain={() => void mutate()} />;
  if (!data) return <SkeletonLines lines={5} />;
  const resting = data.resting.length > 0 && (
    <Box marginBottom="6">
      <Notice tone="warn">{shelfTexts.resting(data.resting.join(', '))}</Notice>
    </Box>
  );
  if (data.items.length === 0 && resting) return resting;
  if (data.items.length === 0)
    return (
      <EmptyState
        title={shelfTexts.empty}
        action={<LinkButton to={paths.home.to()}>{shelfTexts.seeKits}</LinkButton>}
      >
        {shelfTexts.emptyDetail}
      </EmptyState>
    );
  return (
    <>
      {resting}
      <Box as="ul" listStyle="none" aria-label={shelfTexts.title} borderTopWidth="1px" borderColor="hairline">
        {data.items.map((item) => (
          <ShelfRow key={item.slug} item={item} />
        ))}
      </Box>
      <Pager
        page={data.page}
        size={data.size}
        total={data.total}
        addressOf={(change) => paths.shelf.to({}, change)}
      />
    </>
  );
}

/** Where a person's kits stand. */
export function ShelfPage() {
  const state = useSignInState();
  return (
    <>
      <PageTitle title={shelfTexts.title} />
      {state === 'signed-out' ? (
        <SignedOut />
      ) : (
        <Band>
          <Heading level={1} marginBottom="6">
            {shelfTexts.title}
          </Heading>
          {state === 'signed-in' ? <Kits /> : <SkeletonLines lines={5} />}
        </Band>
      )}
    </>
  );
}
