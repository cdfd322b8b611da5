import { Box } from '@chakra-ui/react/box';
import type { ShelfKit } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { reprintTexts } from '../../config/texts/reprint.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { bytes } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { chosenBundle } from './chosen-bundle.js';
import { ClearanceChoice } from './clearance-choice.js';
import { RowAnchor, RowButton, RowLink } from './ruled-rows.js';
import { sectionIds } from './section-ids.js';
import type { Download } from './use-download.js';

export interface ShelfKitActionsProps {
  kit: ShelfKit;
  download: Download;
  onPrinted: (revision: ShelfKit['newest']) => void;
}

/** What one does with a kit on the shelf: fetch it, say what is printed, read about it. */
export function ShelfKitActions({ kit, download, onPrinted }: ShelfKitActionsProps) {
  const { newest, held } = kit;
  const bundle = { kitSlug: kit.slug, revisionId: newest.id };
  const { wish: own, bytes: ownBytes, clearance } = chosenBundle(kit, newest);
  return (
    <>
      <Box display="grid" gap="3" marginBottom="4">
        {newest.bundles.length > 0 && <ClearanceChoice kit={kit} />}
        {newest.isWithdrawn ? (
          <Text isSoft>{shelfKitTexts.nothingToGet}</Text>
        ) : (
          <Button
            onClick={() => void download.start(own)}
            isBusy={download.isStarting(own)}
            busyWords={shelfKitTexts.getting}
          >
            <span>
              {clearance
                ? shelfKitTexts.getBundleIn(clearanceTexts.signs[clearance])
                : shelfKitTexts.getBundle}
              <Box as="span" fontWeight="normal">
                {' '}
                · {bytes(ownBytes)}
              </Box>
            </span>
          </Button>
        )}
        {held?.id !== newest.id && (
          <Button look="outline" onClick={() => onPrinted(newest)}>
            {shelfKitTexts.printed(newest.label)}
          </Button>
        )}
      </Box>
      {download.fault && <Fault level={2} what={shelfKitTexts.getFailed} fault={download.fault} />}
      {clearance && !newest.isWithdrawn && (
        <RowButton onClick={() => void download.start(bundle)} aria-busy={download.isStarting(bundle)}>
          {shelfKitTexts.getAll}
          <Box as="span" color="ink.soft" whiteSpace="nowrap">
            {bytes(newest.bundleBytes)}
          </Box>
        </RowButton>
      )}
      {(newest.isWithdrawn ? [] : kit.documents).map((document) => {
        const wish = { ...bundle, file: document.sha256 };
        return (
          <RowButton
            key={document.sha256 + document.fileName}
            onClick={() => void download.start(wish)}
            aria-busy={download.isStarting(wish)}
          >
            {document.fileName}
            <Box as="span" color="ink.soft" whiteSpace="nowrap">
              {bytes(document.bytes)}
            </Box>
          </RowButton>
        );
      })}
      <RowAnchor href={`#${sectionIds.build}`}>{reprintTexts.build}</RowAnchor>
      {kit.rank.length > 0 && <RowLink to={paths.tuner.to({ slug: kit.slug })}>{shelfKitTexts.tune}</RowLink>}
      <RowAnchor href={`#${sectionIds.changeNotes}`}>{shelfKitTexts.changeNotes}</RowAnchor>
      <RowAnchor href={`#${sectionIds.licence}`}>{shelfKitTexts.licence}</RowAnchor>
      {kit.cautions && <RowAnchor href={`#${sectionIds.cautions}`}>{shelfKitTexts.cautions}</RowAnchor>}
      <RowAnchor href={`#${sectionIds.downloads}`}>{shelfKitTexts.downloads}</RowAnchor>
      <RowLink to={paths.shelfFit.to({ slug: kit.slug })}>{shelfKitTexts.reportFit}</RowLink>
      {kit.orderId && (
        <RowLink to={paths.order.to({ orderId: kit.orderId })}>{shelfKitTexts.receipt}</RowLink>
      )}
      <RowLink to={paths.kit.to({ slug: kit.slug })}>{shelfKitTexts.kitPage}</RowLink>
    </>
  );
}
