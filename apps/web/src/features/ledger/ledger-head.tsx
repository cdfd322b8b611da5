import { Box } from '@chakra-ui/react/box';
import { paths } from '../../config/paths.js';
import { ledgerTexts as texts } from '../../config/texts/workshop-ledger.js';
import { useSession } from '../../lib/session.js';
import { Tabs } from '../../ui/tabs.js';
import { Heading, Text } from '../../ui/text.js';

const tabs = [
  { to: paths.workshop.sales.to(), label: texts.tabs.sales },
  { to: paths.workshop.payments.to(), label: texts.tabs.payments },
  { to: paths.workshop.receipts.to(), label: texts.tabs.receipts },
  { to: paths.workshop.quarters.to(), label: texts.tabs.quarters, isExact: false },
  { to: paths.workshop.rates.to(), label: texts.tabs.rates },
  { to: paths.workshop.locations.to(), label: texts.tabs.locations, isExact: false },
  { to: paths.workshop.reconciliations.to(), label: texts.tabs.reconciliations, isExact: false },
  { to: paths.workshop.exports.to(), label: texts.tabs.exports },
];

/** The ledger's views, for those who may see all of them. */
export function LedgerTabs() {
  const { may } = useSession();
  if (!may('ledger:read')) return null;
  return (
    <Box marginBottom="7">
      <Tabs label={texts.views} tabs={tabs} />
    </Box>
  );
}

export interface LedgerHeadProps {
  title: string;
  lead?: string;
  /** Figures somebody may file. */
  isAboutTax?: boolean;
}

/** The tabs, what this view is, and the caution beside figures of tax. */
export const LedgerHead = ({ title, lead, isAboutTax }: LedgerHeadProps) => (
  <>
    <LedgerTabs />
    <Heading level={1}>{title}</Heading>
    {lead && (
      <Text look="lead" marginTop="2">
        {lead}
      </Text>
    )}
    {isAboutTax && (
      <Text look="small" isSoft marginTop="1">
        {texts.notAdvice}
      </Text>
    )}
    <Box height="6" />
  </>
);
