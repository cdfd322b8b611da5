import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { paths } from '../../config/paths.js';
import { peopleTexts as texts } from '../../config/texts/workshop-people.js';
import { Tabs } from '../../ui/tabs.js';
import { Heading } from '../../ui/text.js';

/** Who works here, and what they did: two views of one room. */
export const PeopleHead = ({ title, action }: { title: string; action?: ReactNode }) => (
  <>
    <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="4">
      <Heading level={1}>{title}</Heading>
      {action}
    </Box>
    <Box marginTop="5" marginBottom="6">
      <Tabs
        label={texts.tabs.label}
        tabs={[
          { to: paths.workshop.people.to(), label: texts.tabs.people },
          { to: paths.workshop.log.to(), label: texts.tabs.log },
        ]}
      />
    </Box>
  </>
);
