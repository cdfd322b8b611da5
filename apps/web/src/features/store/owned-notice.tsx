import { Box } from '@chakra-ui/react/box';
import { kitTexts } from '../../config/texts/kit.js';
import { useBasket } from '../../lib/basket.js';
import { Button } from '../../ui/button.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';

/** For who has the kit: that, and the way to another licence of it. */
export function OwnedNotice({ kitSlug, licenceId }: { kitSlug: string; licenceId: string }) {
  const { holds, add } = useBasket();
  return (
    <Box>
      <StatusMark state="ok">{kitTexts.owned}</StatusMark>
      <Text look="small" isSoft>
        {kitTexts.ownedDetail}
      </Text>
      {!holds(licenceId) && (
        <Button look="plain" size="sm" onClick={() => add({ kitSlug, licenceId })}>
          {kitTexts.putAnother}
        </Button>
      )}
    </Box>
  );
}
