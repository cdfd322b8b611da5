import { Box } from '@chakra-ui/react/box';
import type { ShelfKit } from '@windchest/contracts';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { Text } from '../../ui/text.js';
import { countReprints } from './reprint-list.js';

const Strong = ({ children }: { children: string }) => (
  <Box as="strong" fontWeight="bold">
    {children}
  </Box>
);

/** What the shelf has to say about a kit, in a sentence or two. */
export function ShelfKitHeadline({ kit }: { kit: ShelfKit }) {
  const { held, newest } = kit;
  const { all, print, ifItTroubles, same } = countReprints(kit.reprint.parts);
  const lead = { look: 'lead', color: 'ink', marginTop: '2', maxWidth: '48rem', textWrap: 'pretty' } as const;

  if (!held)
    return (
      <Text {...lead}>
        {shelfKitTexts.holdNothing(newest.label)} <Strong>{shelfKitTexts.getIt(all)}</Strong>
      </Text>
    );
  if (newest.isWithdrawn) return null;
  if (held.id === newest.id)
    return (
      <Text {...lead}>
        {shelfKitTexts.hold(held.label)}{' '}
        {print > 0 ? <Strong>{shelfKitTexts.stillToPrint(print, all)}</Strong> : shelfKitTexts.upToDate}
      </Text>
    );
  const heldAt = kit.revisions.findIndex((one) => one.id === held.id);
  const newestAt = kit.revisions.findIndex((one) => one.id === newest.id);
  return (
    <>
      <Text {...lead}>
        {heldAt >= 0 && heldAt < newestAt ? (
          shelfKitTexts.heldIsNewer(held.label, newest.label)
        ) : (
          <>
            {shelfKitTexts.hold(held.label)} {shelfKitTexts.isOut(newest.label)}
          </>
        )}{' '}
        <Strong>{print > 0 ? shelfKitTexts.reprint(print, all) : shelfKitTexts.reprintNone}</Strong>
        {ifItTroubles > 0 && shelfKitTexts.optional(ifItTroubles, print > 0)}.
      </Text>
      {same > 0 && same < all && (
        <Text isSoft marginTop="1">
          {shelfKitTexts.rest(same)}
        </Text>
      )}
    </>
  );
}
