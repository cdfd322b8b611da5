import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { orderTexts } from '../../config/texts/order.js';
import { Heading, Text } from '../../ui/text.js';

/** What became of a gift: who has the files, and the line that went with it. */
export const GiftOrder = ({ gift }: { gift: NonNullable<BuyerOrder['gift']> }) => (
  <Box display="grid" gap="3">
    <Heading level={2} look="subsection">
      {orderTexts.gift}
    </Heading>
    <Text overflowWrap="anywhere">{orderTexts.giftNext(gift.email)}</Text>
    <Box as="blockquote" paddingLeft="4" borderLeftWidth="1px" borderColor="ink" overflowWrap="anywhere">
      <Text>{gift.greeting}</Text>
      <Text look="small" isSoft>
        {gift.giver}
      </Text>
    </Box>
    <Text look="small" isSoft>
      {orderTexts.giftLost}
    </Text>
  </Box>
);
