import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { paths } from '../../config/paths.js';
import { supportersTexts as texts } from '../../config/texts/workshop-supporters.js';
import { PageTitle } from '../../ui/page-title.js';
import { Tabs } from '../../ui/tabs.js';
import { Heading } from '../../ui/text.js';

/** The head of the two lists: who pledges, and to what. */
export const SupportersHead = ({ action }: { action?: ReactNode }) => (
  <>
    <PageTitle title={texts.title} />
    <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="4" marginBottom="4">
      <Heading level={1}>{texts.title}</Heading>
      {action}
    </Box>
    <Box marginBottom="6">
      <Tabs
        label={texts.views}
        tabs={[
          { to: paths.workshop.supporters.to(), label: texts.tabSupporters },
          { to: paths.workshop.plans.to(), label: texts.tabPlans },
        ]}
      />
    </Box>
  </>
);
