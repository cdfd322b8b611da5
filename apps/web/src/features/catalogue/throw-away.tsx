import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail } from '@windchest/contracts';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { throwAwayTexts } from '../../config/texts/workshop-revision.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

/** Ends a draft, after asking. */
export function ThrowAway({ revision }: { revision: RevisionDetail }) {
  const [isAsking, setIsAsking] = useState(false);
  const navigate = useNavigate();
  const { run, fault } = useAction('DELETE /workshop/revisions/:revisionId', ['GET /workshop/kits/:kitId']);
  const { label, kit } = revision;
  const throwAway = async () => {
    const outcome = await run({ params: { revisionId: revision.id } });
    if (outcome.isDone) void navigate(paths.workshop.kit.to({ kitId: kit.id }));
    return outcome.isDone;
  };
  return (
    <Box marginTop="4">
      <Button look="plain" onClick={() => setIsAsking(true)}>
        {throwAwayTexts.open}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        title={throwAwayTexts.ask(label)}
        confirmLabel={throwAwayTexts.confirm(label)}
        onConfirm={throwAway}
      >
        <Text>{throwAwayTexts.what}</Text>
        {fault && <Fault what={throwAwayTexts.failed} fault={fault} />}
      </ConfirmDialog>
    </Box>
  );
}
