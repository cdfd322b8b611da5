import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { KitPage, KitPart } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { kitTexts } from '../../config/texts/kit.js';
import { partPreviewTexts } from '../../config/texts/part-preview.js';
import { counted } from '../../lib/format.js';
import type { Answered } from '../../lib/use-endpoint.js';
import { Details } from '../../ui/details.js';
import { type DrawnPart, PartsSheet } from '../../ui/drawing/parts-sheet.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';
import { previewOfKitPart } from '../bench/part-preview/previewed-part.js';
import { useTurning } from '../bench/part-preview/use-turning.js';
import { PartsList } from './parts-list.js';

const isPressable = {
  base: { display: 'block', borderRadius: 'sm', cursor: 'pointer', _hover: { '& path': { stroke: 'ink' } } },
} as const;
const PartLink = chakra('a', isPressable);
const PartButton = chakra('button', isPressable);

const drawnParts = (parts: readonly KitPart[]): DrawnPart[] =>
  parts.flatMap(({ code, name, drawing }) => (drawing ? [{ code, name, ...drawing }] : []));

/** Said where parts come in several clearances: which, and how one finds one's own. */
function Clearances({ parts }: { parts: readonly KitPart[] }) {
  const fitted = parts.filter(({ clearances }) => clearances.length > 0);
  const [first] = fitted;
  const gauge = parts.find(({ isGauge }) => isGauge);
  if (!first) return null;
  const codes = clearanceTexts.codes(fitted.map(({ code }) => code));
  return (
    <Text isSoft marginBottom="6" maxWidth="measure">
      {kitTexts.partsClearance(codes, fitted.length === 1, clearanceTexts.all(first.clearances))}
      {gauge && ` ${kitTexts.partsGauge(`${gauge.code} ${gauge.name}`)}`}
    </Text>
  );
}

export interface PartsSectionProps {
  kit: KitPage;
  parts: Answered<KitPart[]>;
}

/** Every part drawn from its mesh, and the list of them. */
export function PartsSection({ kit, parts: { data: parts, fault, mutate } }: PartsSectionProps) {
  const [turning, turn] = useTurning();
  if (!parts)
    return fault ? (
      <Fault what={kitTexts.partsLoading} fault={fault} onAgain={() => void mutate()} />
    ) : (
      <SkeletonLines lines={4} />
    );
  const previews = new Map(parts.map((part) => [part.code, previewOfKitPart(kit.slug, part)]));
  const canTurn = [...previews.values()].some((preview) => preview !== null);
  const pieces = parts.reduce((sum, part) => sum + part.quantity, 0);
  return (
    <>
      <Text isSoft marginBottom={parts.some(({ clearances }) => clearances.length > 0) ? '2' : '6'}>
        {kitTexts.partsLead(
          counted(parts.length, kitTexts.onePart, kitTexts.manyParts),
          counted(pieces, kitTexts.onePiece, kitTexts.manyPieces),
        )}{' '}
        {canTurn && partPreviewTexts.press}
      </Text>
      <Clearances parts={parts} />
      <PartsSheet
        parts={drawnParts(parts)}
        label={kitTexts.partsLabel(kit.name)}
        maxHeightPx={150}
        linkOf={({ code }, drawn) => {
          const preview = previews.get(code);
          if (!preview) return <PartLink href={`#part-${code}`}>{drawn}</PartLink>;
          return (
            <PartButton type="button" aria-haspopup="dialog" onClick={() => turn(preview)}>
              {drawn}
            </PartButton>
          );
        }}
      />
      <Box marginTop="7">
        <Details summary={kitTexts.partsList(parts.length)}>
          <PartsList parts={parts} kit={kit} onTurn={turn} />
        </Details>
      </Box>
      {turning}
    </>
  );
}
