import { Box } from '@chakra-ui/react/box';
import type { ShelfKit } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { reprintTexts } from '../../config/texts/reprint.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { BuildSection } from './build-section.js';
import { DownloadsTable } from './downloads-table.js';
import { RevisionNotes, type RevisionNotesProps } from './revision-notes.js';
import { sectionIds } from './section-ids.js';
import { SmallMarkdown } from './small-markdown.js';

const Section = ({ id, title, children }: { id: string; title: string; children: ReactNode }) => (
  <Box as="section" aria-labelledby={id}>
    <Heading level={2} id={id} marginBottom="4" scrollMarginTop="4">
      {title}
    </Heading>
    {children}
  </Box>
);

const Licence = ({ kit }: { kit: ShelfKit }) => (
  <>
    {kit.licenceName && (
      <Text fontWeight="semibold" marginBottom="2">
        {kit.licenceName}
      </Text>
    )}
    {kit.licenceTerms ? (
      <SmallMarkdown text={kit.licenceTerms} />
    ) : (
      <Text isSoft>{shelfKitTexts.noTerms}</Text>
    )}
  </>
);

/** What is read second: under the sheet. */
export const ShelfKitSections = (props: RevisionNotesProps) => (
  <Band>
    <Box
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 3fr) minmax(0, 2fr)' }}
      columnGap="16"
      rowGap="12"
      alignItems="start"
    >
      <Box display="grid" gap="12">
        <Section id={sectionIds.build} title={reprintTexts.build}>
          <BuildSection kit={props.kit} onPrinted={props.onPrinted} />
        </Section>
        <Section id={sectionIds.changeNotes} title={shelfKitTexts.changeNotes}>
          <RevisionNotes {...props} />
        </Section>
        <Section id={sectionIds.downloads} title={shelfKitTexts.downloads}>
          <DownloadsTable downloads={props.kit.downloads} />
        </Section>
      </Box>
      <Box display="grid" gap="12">
        <Section id={sectionIds.licence} title={shelfKitTexts.licence}>
          <Licence kit={props.kit} />
        </Section>
        {props.kit.cautions && (
          <Section id={sectionIds.cautions} title={shelfKitTexts.cautions}>
            <SmallMarkdown text={props.kit.cautions} />
          </Section>
        )}
      </Box>
    </Box>
  </Band>
);
