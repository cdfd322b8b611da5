import { Box } from '@chakra-ui/react/box';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { archiveTexts as texts } from '../../config/texts/letters.js';
import { date } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Pager } from '../../ui/table/pager.js';
import { Heading, Text } from '../../ui/text.js';

/** News sent so far, newest first. */
export function ArchivePage() {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /letters',
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
      <Text marginTop="2" marginBottom="6">
        <TextLink to={paths.news.to()}>{texts.ask}</TextLink>
      </Text>
      {fault && !data ? (
        <Fault level={2} what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={4} />
      ) : data.items.length === 0 ? (
        <EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>
      ) : (
        <Box maxWidth="measure">
          {data.items.map(({ slug, subject, sentAt }) => (
            <Box as="article" key={slug} borderTopWidth="1px" borderColor="hairline" paddingBlock="4">
              <Heading level={2} look="subsection">
                <TextLink to={paths.letter.to({ slug })}>{subject}</TextLink>
              </Heading>
              <Text look="small" isSoft marginTop="1">
                {texts.sentOn(date(sentAt))}
              </Text>
            </Box>
          ))}
          <Pager
            page={data.page}
            size={data.size}
            total={data.total}
            addressOf={(change) => paths.letters.to({}, change)}
          />
        </Box>
      )}
    </Band>
  );
}
