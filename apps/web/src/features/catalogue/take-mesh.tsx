import type { Part, RevisionFile, VariantClearance } from '@windchest/contracts';
import { useState } from 'react';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { variantTexts as texts } from '../../config/texts/workshop-variants.js';
import { useAction } from '../../lib/use-action.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Text } from '../../ui/text.js';
import { staleByParts } from './revision-context.js';

export interface TakeMeshProps {
  revisionId: string;
  part: Part;
  clearance: VariantClearance;
  others: readonly { file: RevisionFile; code: string }[];
}

/** A mesh that came as a part by itself becomes a clearance of this one, after asking. */
export function TakeMesh({ revisionId, part, clearance, others }: TakeMeshProps) {
  const [fileId, setFileId] = useState('');
  const { run, reset, fault } = useAction(
    'PUT /workshop/revisions/:revisionId/parts/:partId/variants/:clearance',
    staleByParts,
  );
  const chosen = others.find(({ file }) => file.id === fileId);
  const sign = clearanceTexts.signs[clearance];
  const leave = () => {
    reset();
    setFileId('');
  };
  return (
    <>
      <SelectField
        label={texts.take(clearanceTexts.named(clearance))}
        emptyLabel={texts.choose}
        options={others.map(({ file, code }) => ({ value: file.id, label: `${code}: ${file.fileName}` }))}
        value={fileId}
        onChange={(event) => setFileId(event.target.value)}
      />
      <ConfirmDialog
        isOpen={chosen !== undefined}
        onClose={leave}
        title={texts.takeAsk(chosen?.code ?? '', part.code, sign)}
        confirmLabel={texts.takeConfirm(part.code, sign)}
        look="ink"
        onConfirm={async () =>
          (await run({ params: { revisionId, partId: part.id, clearance }, body: { fileId } })).isDone
        }
      >
        <Text>{texts.takeWhat(chosen?.code ?? '', chosen?.file.fileName ?? '')}</Text>
        {fault && <Fault what={texts.failed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
