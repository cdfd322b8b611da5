import type { Gate } from '@windchest/contracts';
import { useState } from 'react';
import { gateTexts, waiverTexts as texts } from '../../config/texts/workshop-revision.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

/** Takes a waiver back, after asking. */
export function TakeWaiverBack({ revisionId, gate }: { revisionId: string; gate: Gate }) {
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('DELETE /workshop/revisions/:revisionId/waivers/:gate', [
    'GET /workshop/revisions/:revisionId',
  ]);
  const name = gateTexts.names[gate.name];
  return (
    <>
      <Button
        look="plain"
        size="sm"
        minHeight="1.75rem"
        paddingBlock="0"
        aria-label={gateTexts.takeBackOf(name)}
        onClick={() => setIsAsking(true)}
      >
        {gateTexts.takeBack}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={texts.takeBackAsk(name)}
        confirmLabel={texts.takeBack}
        onConfirm={async () => (await run({ params: { revisionId, gate: gate.name } })).isDone}
      >
        <Text>{gate.state === 'waived' ? texts.takeBackOpens : texts.takeBackNeedless}</Text>
        {fault && <Fault what={texts.takeBackFailed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
