import type { Part } from '@windchest/contracts';
import { useState } from 'react';
import { partFormTexts as texts } from '../../config/texts/workshop-parts.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { staleByParts } from './revision-context.js';

/** Takes a part out of a draft, after asking. */
export function DropPart({ revisionId, part }: { revisionId: string; part: Part }) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('DELETE /workshop/revisions/:revisionId/parts/:partId', staleByParts);
  return (
    <>
      <Button look="plain" marginRight="auto" onClick={() => setIsAsking(true)}>
        {texts.drop}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.dropAsk(part.code)}
        confirmLabel={texts.drop}
        onConfirm={async () => (await run({ params: { revisionId, partId: part.id } })).isDone}
      >
        <Text>{texts.dropWhat(part.code)}</Text>
        {fault && <Fault what={texts.dropFailed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
