import type { Part, VariantClearance } from '@windchest/contracts';
import { useState } from 'react';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { variantTexts as texts } from '../../config/texts/workshop-variants.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { staleByParts } from './revision-context.js';

export interface TakeVariantOutProps {
  revisionId: string;
  part: Part;
  clearance: VariantClearance;
}

/** Takes a clearance of a part out of a draft, after asking. */
export function TakeVariantOut({ revisionId, part, clearance }: TakeVariantOutProps) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction(
    'DELETE /workshop/revisions/:revisionId/parts/:partId/variants/:clearance',
    staleByParts,
  );
  const sign = clearanceTexts.signs[clearance];
  return (
    <>
      <Button
        look="plain"
        size="sm"
        aria-label={texts.outOf(part.code, sign)}
        onClick={() => setIsAsking(true)}
      >
        {texts.out}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.outAsk(part.code, sign)}
        confirmLabel={texts.out}
        onConfirm={async () => (await run({ params: { revisionId, partId: part.id, clearance } })).isDone}
      >
        <Text>{texts.outWhat(part.code)}</Text>
        {fault && <Fault what={texts.failed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
