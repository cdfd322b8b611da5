import { Box } from '@chakra-ui/react/box';
import { lazy, Suspense, useState } from 'react';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { Text } from '../../ui/text.js';
import { ComparisonLine } from './comparison-line.js';
import { isDifferent, partRows } from './part-rows.js';
import { PartsTable } from './parts-table.js';
import { useRevision } from './revision-context.js';
import { Upload } from './upload/upload.js';
import { useComparedWith } from './use-compared-with.js';
import { useComparison } from './use-comparison.js';

const PartDialog = lazy(async () => ({ default: (await import('./part-dialog.js')).PartDialog }));

/** The parts of a revision, measured and compared; files are dropped here. */
export function PartsTab() {
  const { revision, isWritable } = useRevision();
  const { withId, isOnlyChanged, change } = useComparedWith();
  const { data: comparison, fault, mutate } = useComparison(revision, withId);
  const [editedId, setEditedId] = useState<string>();
  const edited = revision.parts.find((part) => part.id === editedId);
  const rows = partRows(revision.parts, comparison);
  const shown = isOnlyChanged && comparison?.with ? rows.filter(isDifferent) : rows;

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
          <ComparisonLine revision={revision} comparison={comparison}>
            {comparison?.with && (
              <Box marginTop="2">
                <Checkbox
                  label={partsTexts.onlyChanged}
                  checked={isOnlyChanged}
                  onChange={(event) => change({ only: event.target.checked ? 'changed' : '' })}
                />
              </Box>
            )}
          </ComparisonLine>
          {fault && <Fault fault={fault} onAgain={() => void mutate()} />}
          {shown.length === 0 ? (
            <Text isSoft>{partsTexts.allTheSame}</Text>
          ) : (
            <PartsTable
              rows={shown}
              comparedWith={comparison?.with?.label}
              revision={revision}
              onEdit={isWritable ? setEditedId : undefined}
              // Marks are given against what buyers hold now, so against the last released revision.
              isMarkable={isWritable && withId === undefined}
            />
          )}
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
