import { Box } from '@chakra-ui/react/box';
import type { Comparison, RevisionDetail } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Progress } from '../../ui/progress.js';
import { Text } from '../../ui/text.js';
import { countedDifferences } from './part-rows.js';
import { countedShapes } from './use-comparison.js';
import { useComparedWith } from './use-compared-with.js';

const summary = (comparison: Comparison): string => {
  const counts = countedDifferences(comparison.rows);
  return counts.length
    ? counts.map(({ difference, count }) => partsTexts.counted[difference](count)).join(', ')
    : partsTexts.nothing;
};

/** Released revisions before this one, newest first. */
function useEarlier(revision: RevisionDetail) {
  const { data: kit } = useEndpoint('GET /workshop/kits/:kitId', { params: { kitId: revision.kit.id } });
  return (kit?.revisions ?? []).filter(
    (one) => one.id !== revision.id && one.releasedAt !== null && one.createdAt < revision.createdAt,
  );
}

export interface ComparisonLineProps {
  revision: RevisionDetail;
  comparison: Comparison | undefined;
  /** Further choices, under the sentence. */
  children?: ReactNode;
}

/** What differs in a sentence, from which revision, and how far the comparing is. */
export function ComparisonLine({ revision, comparison, children }: ComparisonLineProps) {
  const { withId, change } = useComparedWith();
  const [last, ...older] = useEarlier(revision);
  const { total, waiting } = countedShapes(comparison);
  return (
    <Box marginBottom="3">
      <Box
        display="flex"
        flexWrap="wrap"
        alignItems="flex-end"
        justifyContent="space-between"
        columnGap="6"
        rowGap="3"
      >
        <Box flex="1 1 18rem">
          <Text isSoft aria-live="polite">
            {comparison &&
              (comparison.with
                ? partsTexts.compared(comparison.with.label, summary(comparison))
                : partsTexts.first)}
          </Text>
          {withId && last && (
            <Text isSoft look="small">
              {partsTexts.marksAgainst(last.label)}
            </Text>
          )}
          {children}
        </Box>
        {last && older.length > 0 && (
          <Box flex="0 1 13rem">
            <SelectField
              label={partsTexts.compareWith}
              value={withId === last.id ? '' : (withId ?? '')}
              onChange={(event) => change({ with: event.target.value })}
              emptyLabel={partsTexts.oneBefore(last.label)}
              options={older.map((one) => ({ value: one.id, label: one.label }))}
            />
          </Box>
        )}
      </Box>
      {waiting > 0 && (
        <Box marginTop="3">
          <Progress
            label={partsTexts.comparing}
            done={(total - waiting) / total}
            words={partsTexts.comparedShapes(total - waiting, total)}
          />
        </Box>
      )}
    </Box>
  );
}
