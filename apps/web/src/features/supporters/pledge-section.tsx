import { Box } from '@chakra-ui/react/box';
import { paths } from '../../config/paths.js';
import { pledgeSectionTexts as texts, pledgeStateTexts, supportTexts } from '../../config/texts/pledge.js';
import { price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { AccountSection } from '../accounts/account-section.js';
import { leadOf, pledgeSigns } from './pledge-words.js';

/** The pledge on the account's page, in short. */
export function PledgeSection() {
  const { data, fault, mutate } = useEndpoint('GET /account/pledges', { query: {} });
  const pledge = data?.items[0];
  return (
    <AccountSection title={texts.title}>
      {fault && !data ? (
        <Fault what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={2} />
      ) : pledge ? (
        <>
          <Box display="flex" flexWrap="wrap" columnGap="4" rowGap="1" alignItems="baseline">
            <Box fontWeight="semibold">{pledge.plan.name}</Box>
            <Box>
              {price(pledge.amount)} {supportTexts.aMonth}
            </Box>
            <StatusMark state={pledgeSigns[pledge.state]}>{pledgeStateTexts[pledge.state]}</StatusMark>
          </Box>
          <Text isSoft marginTop="1" marginBottom="4">
            {leadOf(pledge)}
          </Text>
          <LinkButton look="outline" to={paths.pledge.to()}>
            {texts.open}
          </LinkButton>
        </>
      ) : (
        <>
          <Text isSoft marginBottom="4">
            {texts.none}
          </Text>
          <LinkButton look="outline" to={paths.support.to()}>
            {texts.seePlans}
          </LinkButton>
        </>
      )}
    </AccountSection>
  );
}
