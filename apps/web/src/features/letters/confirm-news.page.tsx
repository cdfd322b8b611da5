import { Box } from '@chakra-ui/react/box';
import { useCallback, useEffect, useRef, useState } from 'react';
import { paths } from '../../config/paths.js';
import { newsTexts as texts } from '../../config/texts/letters.js';
import { mailedLinkTexts } from '../../config/texts/account.js';
import { useHashSecret } from '../../lib/hash-secret.js';
import { useAction } from '../../lib/use-action.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

/** Behind the link that confirms the wish for news. The token stands behind `#`: opening it alone confirms nothing. */
export function ConfirmNewsPage() {
  const token = useHashSecret('token');
  const { run, fault } = useAction('POST /news/confirmation');
  const [email, setEmail] = useState<string>();
  const sent = useRef<string>(undefined);
  const confirm = useCallback(async () => {
    if (!token) return;
    sent.current = token;
    const outcome = await run({ body: { token } });
    if (outcome.isDone) setEmail(outcome.data.email);
  }, [token, run]);
  useEffect(() => {
    if (sent.current !== token) void confirm();
  }, [token, confirm]);
  const again = (
    <LinkButton look="outline" size="sm" to={paths.news.to()}>
      {texts.ask}
    </LinkButton>
  );
  return (
    <Band tone="sheet">
      <PageTitle title={texts.confirmTitle} />
      <Heading level={1}>{texts.confirmTitle}</Heading>
      <Box marginTop="6" maxWidth="narrow" role="status">
        {email ? (
          <>
            <Heading level={2}>{texts.confirmed}</Heading>
            <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
              {texts.confirmedDetail(email)}
            </Text>
            <LinkButton look="outline" to={paths.letters.to()}>
              {texts.archive}
            </LinkButton>
          </>
        ) : !token ? (
          <Fault level={2} fault={{ title: mailedLinkTexts.noToken, detail: mailedLinkTexts.noTokenDetail }}>
            {again}
          </Fault>
        ) : fault ? (
          <Fault level={2} fault={{ title: mailedLinkTexts.failed, detail: fault.detail }}>
            {again}
          </Fault>
        ) : (
          <SkeletonLines lines={2} />
        )}
      </Box>
    </Band>
  );
}
