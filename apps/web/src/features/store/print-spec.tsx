import { Box } from '@chakra-ui/react/box';
import type { KitPage } from '@windchest/contracts';
import { kitTexts } from '../../config/texts/kit.js';
import { buildVolume, millimetres, number } from '../../lib/format.js';
import { Text } from '../../ui/text.js';

/** What the maker prints the kit with. */
export function PrintSpec({ kit }: { kit: KitPage }) {
  const { printSpec: spec } = kit;
  const lines = [
    [kitTexts.filament, spec.material],
    [kitTexts.nozzle, millimetres(spec.nozzleMm, 2)],
    [kitTexts.layer, millimetres(spec.layerMm, 2)],
    [kitTexts.perimeters, number(spec.perimeters)],
    [kitTexts.layers, kitTexts.layersOf(number(spec.topLayers), number(spec.bottomLayers))],
    [kitTexts.infill, kitTexts.infillOf(number(spec.infill * 100))],
    [kitTexts.supports, kitTexts.supportKinds[spec.supports]],
    [kitTexts.volume, `${buildVolume(kit.buildVolume)} mm`],
  ];
  return (
    <>
      <Box
        as="dl"
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
        columnGap="8"
        marginTop={{ lg: '-2.5' }}
      >
        {lines.map(([name, value]) => (
          <Box
            key={name}
            display="flex"
            justifyContent="space-between"
            gap="4"
            paddingBlock="2.5"
            borderBottomWidth="1px"
            borderColor="hairline"
          >
            <Box as="dt" color="ink.soft">
              {name}
            </Box>
            <Box as="dd" fontWeight="semibold" textAlign="end">
              {value}
            </Box>
          </Box>
        ))}
      </Box>
      {spec.remarks.trim() && (
        <Text marginTop="4" whiteSpace="pre-line">
          {spec.remarks}
        </Text>
      )}
    </>
  );
}
