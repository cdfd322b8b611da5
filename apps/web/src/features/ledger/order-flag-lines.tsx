import { Box } from '@chakra-ui/react/box';
import type { InputOf, WorkshopOrder } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { ordersTexts as texts, workshopOrderTexts } from '../../config/texts/workshop-orders.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { StatusLine } from '../../ui/status-mark.js';

type Flag = InputOf<'DELETE /workshop/orders/:orderId/flags/:flag'>['params']['flag'];

/** Why somebody should look at an order, what to do, and that it was done. */
export function OrderFlagLines({ order }: { order: WorkshopOrder }) {
  const { may } = useSession();
  const { run, fault, isRunning } = useAction('DELETE /workshop/orders/:orderId/flags/:flag', [
    'GET /workshop/orders/:orderId',
    'GET /workshop/orders',
    'GET /workshop/overview',
  ]);
  const takeOff = (flag: string) => run({ params: { orderId: order.id, flag: flag as Flag } });
  return (
    <>
      {fault && <Fault what={workshopOrderTexts.lookedAtFailed} fault={fault} />}
      <Box as="ul" listStyle="none">
        {order.flags.map((flag) => (
          <StatusLine key={flag} state="warn">
            {texts.flags[flag] ?? flag}
            {texts.flagDetails[flag] && (
              <Box fontSize="sm" lineHeight="snug" color="ink.soft">
                {texts.flagDetails[flag]}
              </Box>
            )}
            {flag === 'location-unclear' && may('ledger:read') && (
              <TextLink to={paths.workshop.locations.to({}, { search: order.number })}>
                {workshopOrderTexts.settleLocation}
              </TextLink>
            )}
            {flag !== 'location-unclear' && may('orders:refund') && (
              <Button
                look="plain"
                size="sm"
                isBusy={isRunning}
                aria-label={workshopOrderTexts.lookedAtOf(texts.flags[flag] ?? flag)}
                onClick={() => void takeOff(flag)}
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
