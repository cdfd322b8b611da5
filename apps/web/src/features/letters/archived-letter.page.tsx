import { Box } from '@chakra-ui/react/box';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { archiveTexts as texts } from '../../config/texts/letters.js';
import { date } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Markdown } from '../../ui/markdown.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

/** A news letter for everybody to read, without what was each reader's own. */
export function ArchivedLetterPage() {
  const { slug = '' } = useParams();
  const { data: letter, fault, mutate } = useEndpoint('GET /letters/:slug', { params: { slug } });
  return (
    <Band>
      <PageTitle title={letter?.subject ?? texts.title} />
      <Text isSoft>
        <TextLink to={paths.letters.to()}>{texts.title}</TextLink>
      </Text>
      {fault && !letter ? (
        <Fault level={1} what={texts.notThere} fault={fault} onAgain={() => void mutate()} />
      ) : !letter ? (
        <SkeletonLines lines={6} />
      ) : (
        <Box as="article" maxWidth="measure">
          <Heading level={1}>{letter.subject}</Heading>
          <Text look="small" isSoft marginTop="1" marginBottom="5">
            {texts.sentOn(date(letter.sentAt))}
          </Text>
          <Markdown text={letter.body} />
          <Text marginTop="8">
            <TextLink to={paths.news.to()}>{texts.ask}</TextLink>
          </Text>
        </Box>
      )}
    </Band>
  );
}
