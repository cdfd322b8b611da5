import { Box } from '@chakra-ui/react/box';
import { cautionTexts } from '../../config/texts/cautions.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';

/** Cautions that hold for every kit. */
export const CautionsPage = () => (
  <Band>
    <PageTitle title={cautionTexts.title} />
    <Heading level={1} look="display">
      {cautionTexts.title}
    </Heading>
    <Text look="lead" marginTop="4">
      {cautionTexts.lead}
    </Text>
    {cautionTexts.groups.map((group) => (
      <Box key={group.name} as="section" marginTop="8" maxWidth="measure">
        <Heading level={2} look="subsection" paddingBottom="2" borderBottomWidth="1px" borderColor="ink">
          {group.name}
        </Heading>
        <Box as="ul" listStyle="none">
          {group.lines.map((line) => (
            <Box as="li" key={line} paddingBlock="2.5" borderBottomWidth="1px" borderColor="hairline">
              {line}
            </Box>
          ))}
        </Box>
      </Box>
    ))}
  </Band>
);
