import { Box } from '@chakra-ui/react/box';
import type { Gate, RevisionDetail } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { gateTexts } from '../../config/texts/workshop-revision.js';
import { date } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { isBeingReleased } from './revision-context.js';
import { TakeWaiverBack } from './take-waiver-back.js';

// A form with its schema: only for those who waive.
const WaiverDialog = lazy(async () => ({ default: (await import('./waiver-dialog.js')).WaiverDialog }));

const wordsOf = ({ state, waiver }: Gate): string => {
  if (!waiver) return '';
  const when = date(waiver.at);
  if (state === 'waived') return gateTexts.waivedBy(waiver.by, when, waiver.reason);
  return state === 'open'
    ? gateTexts.waivedOther(waiver.by, when, waiver.reason, waiver.against)
    : gateTexts.waiverNeedless(waiver.by, when);
};

/** Who waived a gate, when and why; and, for those who may, waiving it or taking that back. */
export function GateWaiver({ revision, gate }: { revision: RevisionDetail; gate: Gate }) {
  const { may } = useSession();
  const [isWriting, setIsWriting] = useState(false);
  const isDraft = revision.state === 'draft' || revision.state === 'proving';
  const mayWaive = isDraft && !isBeingReleased(revision) && may('revisions:release');
  const isWaivable = mayWaive && gate.mayBeWaived && gate.state === 'open';
  const name = gateTexts.names[gate.name];
  if (!gate.waiver && !isWaivable) return null;
  return (
    <>
      {gate.waiver && (
        <Box fontSize="sm" lineHeight="snug" marginTop="1" overflowWrap="anywhere">
          {wordsOf(gate)}
        </Box>
      )}
      {mayWaive && (
        <Box display="flex" gap="4">
          {isWaivable && (
            <Button
              look="plain"
              size="sm"
              minHeight="1.75rem"
              paddingBlock="0"
              aria-label={gateTexts.waiveOf(name)}
              onClick={() => setIsWriting(true)}
            >
              {gateTexts.waive}
            </Button>
          )}
          {gate.waiver && <TakeWaiverBack revisionId={revision.id} gate={gate} />}
        </Box>
      )}
      {isWriting && (
        <Suspense>
          <WaiverDialog revision={revision} gate={gate} onClose={() => setIsWriting(false)} />
        </Suspense>
      )}
    </>
  );
}
