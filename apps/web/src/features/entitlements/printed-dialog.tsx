import type { ShelfKit } from '@windchest/contracts';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { useAction } from '../../lib/use-action.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

export interface PrintedDialogProps {
  slug: string;
  /** The revision the person says is printed; undefined while nothing is asked. */
  revision: ShelfKit['newest'] | undefined;
  onClose: () => void;
}

/** Asks before the shelf takes another revision for the one held. */
export function PrintedDialog({ slug, revision, onClose }: PrintedDialogProps) {
  const saying = useAction('POST /shelf/:slug/held', [
    'GET /shelf/:slug',
    'GET /shelf',
    'GET /shelf/:slug/printed',
    'GET /shelf/:slug/reprint',
    'GET /shelf/:slug/changed-parts',
  ]);
  const label = revision?.label ?? '';
  const confirm = async () =>
    revision !== undefined &&
    (await saying.run({ params: { slug }, body: { revisionId: revision.id } })).isDone;
  return (
    <ConfirmDialog
      isOpen={revision !== undefined}
      onClose={() => {
        saying.reset();
        onClose();
      }}
      title={shelfKitTexts.printedTitle(label)}
      confirmLabel={shelfKitTexts.printedConfirm(label)}
      look="ink"
      onConfirm={confirm}
    >
      <Text>{shelfKitTexts.printedDetail(label)}</Text>
      {saying.fault && <Fault what={shelfKitTexts.printedFailed} fault={saying.fault} />}
    </ConfirmDialog>
  );
}
