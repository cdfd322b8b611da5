import { Box } from '@chakra-ui/react/box';
import type { WorkshopKit } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { kitTexts as texts } from '../../config/texts/workshop-kits.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { StatusMark } from '../../ui/status-mark.js';
import { Heading, Text } from '../../ui/text.js';

/** Whether the kit stands in the shop, and the way in or out, after asking. */
export function ListingSwitch({ kit }: { kit: WorkshopKit }) {
  const { may } = useSession();
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('PATCH /workshop/kits/:kitId', [
    'GET /workshop/kits/:kitId',
    'GET /workshop/kits',
    'GET /kits',
  ]);
  const { isListed, name } = kit;
  return (
    <Box>
      <Heading level={2} look="subsection" marginBottom="2">
        {texts.shop}
      </Heading>
      <Box display="flex" flexWrap="wrap" justifyContent="space-between" gap="3">
        <StatusMark state={isListed ? 'ok' : 'none'} fontSize="md">
          {isListed ? texts.isListed : texts.isHidden}
        </StatusMark>
        {isListed && <TextLink to={paths.kit.to({ slug: kit.slug })}>{texts.seeInShop}</TextLink>}
      </Box>
      {may('kits:write') && (
        <Button look="outline" size="sm" marginTop="4" onClick={() => setIsAsking(true)}>
          {isListed ? texts.hide : texts.list}
        </Button>
      )}
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        look="ink"
        title={isListed ? texts.hideAsk(name) : texts.listAsk(name)}
        confirmLabel={isListed ? texts.hideConfirm : texts.listConfirm}
        onConfirm={async () =>
          (await run({ params: { kitId: kit.id }, body: { isListed: !isListed } })).isDone
        }
      >
        <Text>{isListed ? texts.hideWhat : texts.listWhat}</Text>
        {fault && <Fault what={texts.listFailed} fault={fault} />}
      </ConfirmDialog>
    </Box>
  );
}
