import { Box } from '@chakra-ui/react/box';
import type { Supporter } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { ordersTexts, workshopOrderTexts } from '../../config/texts/workshop-orders.js';
import { supporterTexts as texts } from '../../config/texts/workshop-supporters.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { StatusLine } from '../../ui/status-mark.js';

/** Why somebody should look at a pledge, what to do, and that it was done. */
export function PledgeFlagLines({ supporter: { id, number, flags } }: { supporter: Supporter }) {
  const { may } = useSession();
  const { run, fault, isRunning } = useAction('DELETE /workshop/supporters/:pledgeId/flags/:flag', [
    'GET /workshop/supporters/:pledgeId',
    'GET /workshop/supporters',
  ]);
  return (
    <>
      {fault && <Fault what={workshopOrderTexts.lookedAtFailed} fault={fault} />}
      <Box as="ul" listStyle="none">
        {flags.map((flag) => (
          <StatusLine key={flag} state="warn">
            {ordersTexts.flags[flag] ?? flag}
            <Box fontSize="sm" lineHeight="snug" color="ink.soft">
              {texts.flagDetails[flag]}
            </Box>
            {flag === 'location-unclear' && may('ledger:read') && (
              <TextLink to={paths.workshop.locations.to({}, { search: number })}>
                {workshopOrderTexts.settleLocation}
              </TextLink>
            )}
            {flag !== 'location-unclear' && may('orders:refund') && (
              <Button
                look="plain"
                size="sm"
                isBusy={isRunning}
                aria-label={workshopOrderTexts.lookedAtOf(ordersTexts.flags[flag] ?? flag)}
                onClick={() => void run({ params: { pledgeId: id, flag } })}
              >
                {workshopOrderTexts.lookedAt}
              </Button>
            )}
          </StatusLine>
        ))}
      </Box>
    </>
  );
}
