import { Box } from '@chakra-ui/react/box';
import type { PrinterCard } from '@windchest/contracts';
import { ownPrintersTexts as texts } from '../../config/texts/printer.js';
import { buildVolume } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Text } from '../../ui/text.js';
import { printerWords } from '../bench/printer-words.js';

export interface PrinterRowProps {
  card: PrinterCard;
  onChange: () => void;
  onMakeMain: () => void;
  onRemove: () => void;
}

/** One printer of the account, and what can be done with it. */
export function PrinterRow({ card, onChange, onMakeMain, onRemove }: PrinterRowProps) {
  const { session } = useSession();
  return (
    <Box
      as="li"
      display="flex"
      flexWrap="wrap"
      alignItems="baseline"
      justifyContent="space-between"
      columnGap="6"
      rowGap="2"
      paddingBlock="3"
      borderBottomWidth="1px"
      borderColor="hairline"
    >
      <Box minWidth="0" flex="1 1 22rem">
        <Box display="flex" flexWrap="wrap" columnGap="4" alignItems="baseline">
          <Box as="span" fontWeight="semibold" overflowWrap="anywhere">
            {card.name}
          </Box>
          {card.isMain && <StatusMark state="ok">{texts.main}</StatusMark>}
        </Box>
        <Text look="small" isSoft>
          {buildVolume(card.bed)} mm · {printerWords(card, session?.workshop.currency ?? 'EUR')}
        </Text>
      </Box>
      <Box display="flex" flexWrap="wrap" columnGap="4">
        {!card.isMain && (
          <Button look="plain" size="sm" aria-label={texts.makeMainOf(card.name)} onClick={onMakeMain}>
            {texts.makeMain}
          </Button>
        )}
        <Button
          look="plain"
          size="sm"
          aria-haspopup="dialog"
          aria-label={texts.changeOf(card.name)}
          onClick={onChange}
        >
          {texts.change}
        </Button>
        <Button
          look="plain"
          size="sm"
          aria-haspopup="dialog"
          aria-label={texts.removeOf(card.name)}
          onClick={onRemove}
        >
          {texts.remove}
        </Button>
      </Box>
    </Box>
  );
}
