import { Box } from '@chakra-ui/react/box';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { stopTexts as texts } from '../../config/texts/letters.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

/** Behind the link at a mail's foot: says what stops and for whom; one press, no signing in. */
export function UnsubscribePage() {
  const { token = '' } = useParams();
  const { data, fault } = useEndpoint('GET /unsubscribe/:token/about', { params: { token } });
  const stop = useAction('POST /unsubscribe/:token');
  const [isDone, setIsDone] = useState(false);
  const words = data && (data.kind === 'news' ? texts.news : texts.revisions(data.kitName ?? ''));
  const isStopped = isDone || data?.isStopped === true;
  return (
    <Band tone="sheet">
      <PageTitle title={texts.title} />
      <Heading level={1}>{texts.title}</Heading>
      <Box marginTop="6" maxWidth="narrow">
        {fault && !data ? (
          <Fault level={2} what={texts.failed} fault={fault} />
        ) : !data || !words ? (
          <SkeletonLines lines={3} />
        ) : (
          <>
            <Heading level={2}>{isStopped ? words.stopped : words.what}</Heading>
            <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
              {texts.lead(data.email)}
            </Text>
            {!isStopped && (
              <Button
                isBusy={stop.isRunning}
                onClick={async () => setIsDone((await stop.run({ params: { token } })).isDone)}
              >
                {words.stop}
              </Button>
            )}
            {stop.fault && <Fault level={2} what={texts.notStopped} fault={stop.fault} />}
            <Box role="status" marginTop="4">
              {isStopped && (
                <Text>
                  {texts.again} <TextLink to={paths.account.to()}>{texts.toAccount}</TextLink>
                </Text>
              )}
            </Box>
            {data.kind === 'news' && (
              <Text look="small" isSoft marginTop="3">
                {texts.newsStay}
              </Text>
            )}
          </>
        )}
      </Box>
    </Band>
  );
}
