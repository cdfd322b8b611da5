import { Box } from '@chakra-ui/react/box';
import { Navigate, useParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { archiveTexts, ownLetterTexts as texts } from '../../config/texts/letters.js';
import { date } from '../../lib/format.js';
import { useSignInState } from '../../lib/sign-in-gate.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Markdown } from '../../ui/markdown.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

/** A letter to oneself, with one's own list. */
export function OwnLetterPage() {
  const { recipientId = '' } = useParams();
  const state = useSignInState();
  const {
    data: letter,
    fault,
    mutate,
  } = useEndpoint(
    'GET /account/letters/:recipientId',
    state === 'signed-in' ? { params: { recipientId } } : null,
  );
  if (state === 'signed-out')
    return <Navigate to={signInThenBack(paths.ownLetter.to({ recipientId }))} replace />;
  return (
    <Band>
      <PageTitle title={letter?.subject ?? texts.section} />
      <Text isSoft>
        <TextLink to={paths.account.to()}>{texts.back}</TextLink>
      </Text>
      {fault && !letter ? (
        <Fault level={1} what={archiveTexts.notThere} fault={fault} onAgain={() => void mutate()} />
      ) : !letter ? (
        <SkeletonLines lines={6} />
      ) : (
        <Box as="article" maxWidth="measure">
          <Heading level={1}>{letter.subject}</Heading>
          <Text look="small" isSoft marginTop="1" marginBottom="5">
            {archiveTexts.sentOn(date(letter.sentAt))}
          </Text>
          <Markdown text={letter.body} />
        </Box>
      )}
    </Band>
  );
}
