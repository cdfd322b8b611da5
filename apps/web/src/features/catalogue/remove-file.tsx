import type { RevisionFile } from '@windchest/contracts';
import { useState } from 'react';
import { filesTexts as texts } from '../../config/texts/workshop-notes.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { staleByParts } from './revision-context.js';

export interface RemoveFileProps {
  revisionId: string;
  file: RevisionFile;
  partCode: string | null;
}

/** Takes a file out of a draft, after asking. */
export function RemoveFile({ revisionId, file, partCode }: RemoveFileProps) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('DELETE /workshop/revisions/:revisionId/files/:fileId', staleByParts);
  return (
    <>
      <Button
        look="plain"
        size="sm"
        minHeight="1.5rem"
        paddingBlock="0"
        aria-label={texts.removeOf(file.fileName)}
        onClick={() => setIsAsking(true)}
      >
        {texts.remove}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.removeAsk(file.fileName)}
        confirmLabel={texts.remove}
        onConfirm={async () => (await run({ params: { revisionId, fileId: file.id } })).isDone}
      >
        <Text>
          {partCode === null
            ? texts.removeDocument
            : file.clearance === 'zero'
              ? texts.removeMesh(partCode)
              : texts.removeVariant(partCode)}
        </Text>
        {fault && <Fault what={texts.failed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
