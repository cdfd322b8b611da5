import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail } from '@windchest/contracts';
import { useState } from 'react';
import { useSWRConfig } from 'swr';
import { gateTexts, releaseTexts } from '../../config/texts/workshop-revision.js';
import { useSession } from '../../lib/session.js';
import { isAnswerOf, useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Progress } from '../../ui/progress.js';
import { Text } from '../../ui/text.js';
import { isBeingReleased } from './revision-context.js';

const stale = ['GET /workshop/revisions/:revisionId', 'GET /workshop/kits/:kitId'] as const;

/** What was said no with: by the last press, or by the work that followed it. */
function ReleaseFault({ label, fault }: { label: string; fault: { title: string; detail?: string } }) {
  return (
    <Box bg="sheet" paddingInline="3">
      <Fault what={releaseTexts.failed(label)} fault={fault} />
    </Box>
  );
}

/** The one thing this page leads to. */
export function ReleaseAction({
  revision,
  holders,
}: {
  revision: RevisionDetail;
  holders: number | undefined;
}) {
  const { may } = useSession();
  const { mutate } = useSWRConfig();
  const [isAsking, setIsAsking] = useState(false);
  const { run, fault } = useAction('POST /workshop/revisions/:revisionId/release', stale);
  const { label, release, kit } = revision;
  const open = revision.gates.filter((gate) => gate.state === 'open').length;
  const waived = revision.gates.flatMap(({ state, name }) =>
    state === 'waived' ? gateTexts.names[name] : [],
  );

  if (isBeingReleased(revision))
    return (
      <Box padding="3" aria-live="polite">
        <Progress
          label={release.state === 'waiting' ? releaseTexts.waiting : releaseTexts.building}
          done={release.state === 'waiting' ? undefined : release.percent / 100}
        />
      </Box>
    );
  if (!may('revisions:release'))
    return (
      <Box padding="3" color="ink.soft">
        {releaseTexts.notAllowed(label)}
      </Box>
    );
  return (
    <>
      {fault ? (
        <ReleaseFault label={label} fault={fault} />
      ) : (
        release.state === 'failed' &&
        release.fault && <ReleaseFault label={label} fault={{ title: release.fault }} />
      )}
      <Button look="cell" minHeight="3.25rem" disabled={open > 0} onClick={() => setIsAsking(true)}>
        {open > 0 ? releaseTexts.gatesOpen(label, open) : releaseTexts.release(label)}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        look="ink"
        title={releaseTexts.ask(kit.name, label)}
        confirmLabel={releaseTexts.release(label)}
        cancelLabel={releaseTexts.keep}
        onConfirm={async () => {
          const { isDone } = await run({ params: { revisionId: revision.id } });
          // What was said no to is told by gates that have opened meanwhile.
          if (!isDone) await mutate(isAnswerOf(stale));
          return true;
        }}
      >
        <Text>
          {releaseTexts.what(
            label,
            holders === undefined ? releaseTexts.holdersUnknown : releaseTexts.holdersCounted(holders),
          )}
        </Text>
        {waived.length > 0 && <Text marginTop="3">{releaseTexts.waived(waived)}</Text>}
        <Text marginTop="3">{releaseTexts.final(label)}</Text>
      </ConfirmDialog>
    </>
  );
}
