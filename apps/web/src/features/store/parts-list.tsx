import { Box } from '@chakra-ui/react/box';
import type { KitPage, KitPart } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { kitTexts } from '../../config/texts/kit.js';
import { number } from '../../lib/format.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Text } from '../../ui/text.js';
import { partPreviewTexts } from '../../config/texts/part-preview.js';
import type { PreviewedPart } from '../bench/part-preview/part-turner.js';
import { previewOfKitPart } from '../bench/part-preview/previewed-part.js';
import { TurnButton } from '../bench/part-preview/turn-button.js';
import { ownSettings } from './own-settings.js';

const sizeWords = ({ sizeMm: { x, y, z } }: KitPart) => [x, y, z].map((side) => number(side, 1)).join(' × ');

export interface PartsListProps {
  parts: readonly KitPart[];
  kit: KitPage;
  onTurn: (part: PreviewedPart) => void;
}

/** The parts of a kit by their codes; assembly and change notes link here. */
export function PartsList({ parts, kit, onTurn }: PartsListProps) {
  const columns: Column<KitPart>[] = [
    {
      key: 'part',
      header: kitTexts.partName,
      isHeading: true,
      cell: (part) => {
        const own = part.printSpec ? ownSettings(part.printSpec, kit.printSpec) : [];
        return (
          <Box id={`part-${part.code}`} scrollMarginTop="4" _target={{ textDecoration: 'underline' }}>
            <Box as="span" fontWeight="semibold">
              {part.code}
            </Box>{' '}
            {part.name}
            {part.isGauge && (
              <Text look="small" isSoft fontWeight="normal">
                {kitTexts.isGauge}
              </Text>
            )}
            {part.clearances.length > 0 && (
              <Text look="small" isSoft fontWeight="normal">
                {kitTexts.inClearances(clearanceTexts.all(part.clearances))}
              </Text>
            )}
            {own.length > 0 && (
              <Text look="small" isSoft fontWeight="normal">
                {kitTexts.ownSettings(own.join(', '))}
              </Text>
            )}
          </Box>
        );
      },
    },
    { key: 'quantity', header: kitTexts.quantity, isNumeric: true, cell: (part) => number(part.quantity) },
    { key: 'size', header: kitTexts.size, isNumeric: true, cell: sizeWords },
    {
      key: 'turn',
      header: partPreviewTexts.column,
      isNumeric: true,
      cell: (part) => {
        const preview = previewOfKitPart(kit.slug, part);
        return preview && <TurnButton code={part.code} onTurn={() => onTurn(preview)} />;
      },
    },
  ];
  return (
    <HairlineTable
      caption={kitTexts.partsLabel(kit.name)}
      columns={columns}
      rows={parts}
      rowKey={(part) => part.code}
    />
  );
}
