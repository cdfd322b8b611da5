import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import { workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { dateTime } from '../../lib/format.js';
import { Text } from '../../ui/text.js';

/** What happened to an order, one after the other. */
export const OrderHistory = ({ order }: { order: WorkshopOrder }) =>
  order.history.length === 0 ? (
    <Text isSoft>{texts.noHistory}</Text>
  ) : (
    <Box as="ol" listStyle="none">
      {order.history.map((entry, at) => (
        <Box
          as="li"
          key={`${entry.at} ${at}`}
          display="grid"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '11rem minmax(0, 1fr)' }}
          columnGap="4"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="time" color="ink.soft">
            {dateTime(entry.at)}
          </Box>
          <Box overflowWrap="anywhere">
            {entry.what}
            {entry.detail && (
              <Box fontSize="sm" lineHeight="snug" color="ink.soft">
                {entry.detail}
              </Box>
            )}
          </Box>
        </Box>
      ))}
    </Box>
  );
