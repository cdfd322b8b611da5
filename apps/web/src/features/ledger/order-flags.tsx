import { Box } from '@chakra-ui/react/box';
import { ordersTexts as texts } from '../../config/texts/workshop-orders.js';
import { StatusMark } from '../../ui/status-mark.js';

/** Why somebody should look at an order, in a word each. */
export const OrderFlags = ({ flags }: { flags: readonly string[] }) =>
  flags.map((flag) => (
    <Box key={flag}>
      <StatusMark state="warn">{texts.flags[flag] ?? flag}</StatusMark>
    </Box>
  ));
