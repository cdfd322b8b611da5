import { Box } from '@chakra-ui/react/box';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { journalTexts as texts } from '../../config/texts/journal.js';
import { apiAddress } from '../../lib/api-address.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextAnchor, TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading, Text } from '../../ui/text.js';
import { PostFacts } from './post-facts.js';

/** The maker's posts, newest first. */
export function JournalPage() {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /journal',
    { query: { page } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2">
        {texts.lead}
      </Text>
      <Text look="small" isSoft marginTop="2" marginBottom="7">
        <TextAnchor href={apiAddress('GET /journal.atom', {})}>{texts.feed}</TextAnchor>
      </Text>
      {fault && !data ? (
        <Fault level={2} what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={6} />
      ) : data.items.length === 0 ? (
        <EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>
      ) : (
        <Box maxWidth="measure">
          {data.items.map((post) => (
            <Box
              as="article"
              key={post.slug}
              borderTopWidth="1px"
              borderColor="hairline"
              paddingTop="4"
              paddingBottom="6"
            >
              <Heading level={2} look="subsection">
                <TextLink to={paths.post.to({ slug: post.slug })}>{post.title}</TextLink>
              </Heading>
              {post.lead && <Text marginTop="1.5">{post.lead}</Text>}
              <Box marginTop="2">
                <PostFacts post={post} />
              </Box>
            </Box>
          ))}
          <Pager
            page={data.page}
            size={data.size}
            total={data.total}
            addressOf={(change) => paths.journal.to({}, change)}
          />
        </Box>
      )}
    </Band>
  );
}
