import { Box } from '@chakra-ui/react/box';
import type { Comparison, RevisionDetail } from '@windchest/contracts';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Text } from '../../ui/text.js';
import { countedDifferences } from './part-rows.js';

const summary = (comparison: Comparison): string => {
  const counts = countedDifferences(comparison.rows);
  return counts.length
    ? counts.map(({ difference, count }) => partsTexts.counted[difference](count)).join(', ')
    : partsTexts.nothing;
};

export interface ComparisonLineProps {
  revision: RevisionDetail;
  comparison: Comparison | undefined;
  withId: string | undefined;
  onWith: (id: string) => void;
}

/** What differs in a sentence, and from which revision. */
export function ComparisonLine({ revision, comparison, withId, onWith }: ComparisonLineProps) {
  const { data: kit } = useEndpoint('GET /workshop/kits/:kitId', { params: { kitId: revision.kit.id } });
  const earlier = (kit?.revisions ?? []).filter(
    (one) => one.id !== revision.id && one.releasedAt !== null && one.createdAt < revision.createdAt,
  );
  return (
    <Box
      display="flex"
      flexWrap="wrap"
      alignItems="flex-end"
      justifyContent="space-between"
      columnGap="6"
      rowGap="2"
      marginBottom="2"
    >
      <Text isSoft aria-live="polite" flex="1 1 18rem">
        {comparison &&
          (comparison.with
            ? partsTexts.compared(comparison.with.label, summary(comparison))
            : partsTexts.first)}
      </Text>
      {earlier.length > 0 && (
        <Box flex="0 1 13rem">
          <SelectField
            label={partsTexts.compareWith}
            value={withId ?? ''}
            onChange={(event) => onWith(event.target.value)}
            emptyLabel={partsTexts.lastReleased}
            options={earlier.map((one) => ({ value: one.id, label: one.label }))}
          />
        </Box>
      )}
    </Box>
  );
}
