import { paths } from '../../config/paths.js';
import { letterFormTexts as texts, lettersTexts } from '../../config/texts/workshop-letters.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { WriteLetter } from './write-letter.js';

/** Drafts a letter. */
export function NewLetterPage() {
  const { data: choices, fault, mutate } = useEndpoint('GET /workshop/letters/choices');
  return (
    <Band>
      <PageTitle title={texts.newTitle} />
      <Text isSoft>
        <TextLink to={paths.workshop.letters.to()}>{lettersTexts.title}</TextLink>
      </Text>
      <Heading level={1} marginBottom="6">
        {texts.newTitle}
      </Heading>
      {fault && !choices ? (
        <Fault level={2} fault={fault} onAgain={() => void mutate()} />
      ) : choices ? (
        <WriteLetter letter={null} choices={choices} />
      ) : (
        <SkeletonLines lines={8} />
      )}
    </Band>
  );
}
