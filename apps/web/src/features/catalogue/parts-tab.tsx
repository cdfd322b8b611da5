import { Box } from '@chakra-ui/react/box';
import type { Part } from '@windchest/contracts';
import { lazy, Suspense, useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { ComparisonLine } from './comparison-line.js';
import { meshesOf } from './part-meshes.js';
import { partRows } from './part-rows.js';
import { PartsTable } from './parts-table.js';
import { useRevision } from './revision-context.js';
import { Upload } from './upload/upload.js';

const PartDialog = lazy(async () => ({ default: (await import('./part-dialog.js')).PartDialog }));

/** What a comparison was made from; when it changes, the comparison is old. */
const fingerprint = (parts: readonly Part[]) =>
  parts
    .map((part) =>
      [
        part.code,
        part.quantity,
        ...meshesOf(part).map(({ clearance, file }) => `${clearance} ${file.sha256} ${file.measuring}`),
      ].join(' '),
    )
    .sort()
    .join();

function useComparison(revisionId: string, withId: string | undefined, parts: readonly Part[]) {
  const answer = useEndpoint(
    'GET /workshop/revisions/:revisionId/comparison',
    { params: { revisionId }, query: { with: withId } },
    { keepPreviousData: true },
  );
  const { mutate } = answer;
  const made = fingerprint(parts);
  const lastMade = useRef(made);
  useEffect(() => {
    if (made === lastMade.current) return;
    lastMade.current = made;
    void mutate();
  }, [made, mutate]);
  return answer;
}

/** The parts of a revision, measured and compared; files are dropped here. */
export function PartsTab() {
  const { revision, isWritable } = useRevision();
  const [params, setParams] = useSearchParams();
  const withId = params.get('with') ?? undefined;
  const { data: comparison, fault, mutate } = useComparison(revision.id, withId, revision.parts);
  const [editedId, setEditedId] = useState<string>();
  const edited = revision.parts.find((part) => part.id === editedId);
  const rows = partRows(revision.parts, comparison);

  return (
    <>
      {isWritable && (
        <Box marginBottom="5">
          <Upload revision={revision} />
        </Box>
      )}
      {rows.length === 0 ? (
        <EmptyState title={partsTexts.empty}>
          {isWritable ? partsTexts.emptyDetail : partsTexts.emptyReadOnly}
        </EmptyState>
      ) : (
        <>
          <ComparisonLine
            revision={revision}
            comparison={comparison}
            withId={withId}
            onWith={(id) => setParams(id ? { with: id } : {}, { replace: true })}
          />
          {fault && <Fault fault={fault} onAgain={() => void mutate()} />}
          <PartsTable
            rows={rows}
            comparedWith={comparison?.with?.label}
            revisionId={revision.id}
            onEdit={isWritable ? setEditedId : undefined}
          />
        </>
      )}
      {edited && (
        <Suspense>
          <PartDialog
            key={edited.id}
            revision={revision}
            part={edited}
            onClose={() => setEditedId(undefined)}
          />
        </Suspense>
      )}
    </>
  );
}
