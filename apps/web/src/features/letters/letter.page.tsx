import { Box } from '@chakra-ui/react/box';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { letterFormTexts as texts, lettersTexts } from '../../config/texts/workshop-letters.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';
import { letterSigns } from './letter-signs.js';
import { SendingView } from './sending-view.js';
import { WriteLetter } from './write-letter.js';

/** One letter: a draft to write, or how far it is on its way. */
export function WorkshopLetterPage() {
  const { letterId = '' } = useParams();
  const {
    data: letter,
    fault,
    mutate,
  } = useEndpoint(
    'GET /workshop/letters/:letterId',
    { params: { letterId } },
    {
      refreshInterval: (one) => (one && ['scheduled', 'sending'].includes(one.state) ? 1000 : 0),
      revalidateOnFocus: false,
    },
  );
  const isDraft = letter?.state === 'draft';
  const choices = useEndpoint('GET /workshop/letters/choices', isDraft ? {} : null);
  const anyFault = fault ?? choices.fault;
  return (
    <Band>
      <PageTitle title={letter?.subject ?? lettersTexts.title} />
      <Text isSoft>
        <TextLink to={paths.workshop.letters.to()}>{lettersTexts.title}</TextLink>
      </Text>
      {anyFault && !letter ? (
        <Fault level={1} what={texts.notFound} fault={anyFault} onAgain={() => void mutate()} />
      ) : !letter ? (
        <SkeletonLines lines={8} />
      ) : (
        <>
          <Heading level={1} overflowWrap="anywhere">
            {letter.subject}
          </Heading>
          <Box marginTop="1" marginBottom="6">
            <StatusMark state={letterSigns[letter.state]}>{lettersTexts.states[letter.state]}</StatusMark>
          </Box>
          {!isDraft ? (
            <SendingView letter={letter} />
          ) : choices.data ? (
            <WriteLetter key={letter.id} letter={letter} choices={choices.data} />
          ) : (
            <SkeletonLines lines={8} />
          )}
        </>
      )}
    </Band>
  );
}
