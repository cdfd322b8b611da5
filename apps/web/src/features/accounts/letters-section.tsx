import { Box } from '@chakra-ui/react/box';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { ownLetterTexts as texts } from '../../config/texts/letters.js';
import { date } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';
import { AccountSection } from './account-section.js';

const SIZE = 5;

const News = () => {
  const { data, fault } = useEndpoint('GET /account/news');
  const set = useAction('PUT /account/news', ['GET /account/news']);
  if (fault && !data) return <Fault fault={fault} />;
  if (!data) return <SkeletonLines lines={1} />;
  const gets = data.state === 'confirmed';
  return (
    <Box marginBottom="6">
      <Text role="status" marginBottom="2">
        {texts.newsStates[data.state]}
      </Text>
      <Button
        look="outline"
        size="sm"
        isBusy={set.isRunning}
        onClick={() => void set.run({ body: { isWanted: !gets } })}
      >
        {gets ? texts.stopNews : texts.wantNews}
      </Button>
      {set.fault && <Fault what={texts.newsFailed} fault={set.fault} />}
    </Box>
  );
};

/** News wanted or not, and what the workshop has written to oneself. */
export function LettersSection() {
  const [page, setPage] = useState(1);
  const { data, fault, mutate } = useEndpoint(
    'GET /account/letters',
    { query: { page, size: SIZE } },
    { keepPreviousData: true },
  );
  return (
    <AccountSection title={texts.section}>
      <News />
      {fault && !data ? (
        <Fault what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={2} />
      ) : data.total === 0 ? (
        <Text isSoft>{texts.empty}</Text>
      ) : (
        <Box maxWidth="measure">
          <Box as="ul" listStyle="none" borderTopWidth="1px" borderColor="hairline">
            {data.items.map(({ id, subject, kind, sentAt }) => (
              <Box as="li" key={id} paddingBlock="2.5" borderBottomWidth="1px" borderColor="hairline">
                <TextLink to={paths.ownLetter.to({ recipientId: id })} fontWeight="semibold">
                  {subject}
                </TextLink>
                <Text look="small" isSoft>
                  {date(sentAt)}, {texts.kinds[kind]}
                </Text>
              </Box>
            ))}
          </Box>
          {data.total > SIZE && (
            <Box as="nav" aria-label={texts.pages} display="flex" gap="3" marginTop="3">
              {page > 1 && (
                <Button look="outline" size="sm" onClick={() => setPage(page - 1)}>
                  {texts.readLater}
                </Button>
              )}
              {page * SIZE < data.total && (
                <Button look="outline" size="sm" onClick={() => setPage(page + 1)}>
                  {texts.readEarlier}
                </Button>
              )}
            </Box>
          )}
        </Box>
      )}
    </AccountSection>
  );
}
