import { Box } from '@chakra-ui/react/box';
import { ordersTexts as texts } from '../../config/texts/workshop-orders.js';
import { StatusLine, StatusMark } from '../../ui/status-mark.js';

/** Why somebody should look at an order, in a word each. */
export const OrderFlags = ({ flags }: { flags: readonly string[] }) =>
  flags.map((flag) => (
    <Box key={flag}>
      <StatusMark state="warn">{texts.flags[flag] ?? flag}</StatusMark>
    </Box>
  ));

/** The same with what to do. */
export const OrderFlagLines = ({ flags }: { flags: readonly string[] }) => (
  <Box as="ul" listStyle="none">
    {flags.map((flag) => (
      <StatusLine key={flag} state="warn">
        {texts.flags[flag] ?? flag}
        {texts.flagDetails[flag] && (
          <Box fontSize="sm" lineHeight="snug" color="ink.soft">
            {texts.flagDetails[flag]}
          </Box>
        )}
      </StatusLine>
    ))}
  </Box>
);
