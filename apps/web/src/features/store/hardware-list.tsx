import { Box } from '@chakra-ui/react/box';
import type { HardwareItem } from '@windchest/contracts';
import { kitTexts } from '../../config/texts/kit.js';
import { number } from '../../lib/format.js';
import { Text } from '../../ui/text.js';

const amountOf = ({ quantity, unit }: HardwareItem) =>
  unit ? `${number(quantity, 2)} ${unit}` : `${number(quantity, 2)} ×`;

/** Screws, bands, felt: what has to be bought or found. */
export function HardwareList({ hardware }: { hardware: readonly HardwareItem[] }) {
  if (hardware.length === 0) return <Text isSoft>{kitTexts.noHardware}</Text>;
  return (
    <Box as="ul" listStyle="none" marginTop={{ lg: '-2.5' }}>
      {hardware.map((item) => (
        <Box
          as="li"
          key={`${item.name} ${item.remark}`}
          display="grid"
          gridTemplateColumns="4rem minmax(0, 1fr)"
          columnGap="4"
          paddingBlock="2.5"
          borderBottomWidth="1px"
          borderColor="hairline"
          _last={{ borderBottomWidth: '0' }}
        >
          <Box fontWeight="semibold">{amountOf(item)}</Box>
          <Box>
            {item.name}
            {item.remark && (
              <Text look="small" isSoft>
                {item.remark}
              </Text>
            )}
          </Box>
        </Box>
      ))}
    </Box>
  );
}
