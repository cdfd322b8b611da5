import { Box } from '@chakra-ui/react/box';
import { changesTexts as texts } from '../../config/texts/workshop-changes.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { ChangedPart } from './changed-part.js';
import { ComparisonLine } from './comparison-line.js';
import { partRows, type PartRow } from './part-rows.js';
import { useRevision } from './revision-context.js';
import { useComparedWith } from './use-compared-with.js';
import { useComparison } from './use-comparison.js';

const others = ['new', 'dropped', 're-exported'] as const;

/** The kinds of difference that need no drawing, a line each. */
const OtherLines = ({ rows }: { rows: readonly PartRow[] }) => (
  <>
    {others.map((kind) => {
      const parts = rows.filter(({ comparison }) => comparison?.difference === kind);
      return (
        parts.length > 0 && (
          <Text key={kind} marginTop="3" maxWidth="measure">
            <Box as="span" fontWeight="semibold">
              {texts.others[kind]}:
            </Box>{' '}
            {parts.map(({ code, name }) => `${code} ${name}`).join(', ')}
          </Text>
        )
      );
    })}
  </>
);

/** Every changed part, drawn from three sides with the place where it differs most. */
export function WhatDiffers() {
  const { revision, isWritable } = useRevision();
  const { withId } = useComparedWith();
  const { data: comparison, fault, mutate } = useComparison(revision, withId);
  const earlierId = comparison?.with?.id;
  const { data: earlier } = useEndpoint(
    'GET /workshop/revisions/:revisionId',
    earlierId ? { params: { revisionId: earlierId } } : null,
  );
  const rows = partRows(revision.parts, comparison);
  const changed = rows.filter((row) => row.comparison?.difference === 'changed');
  return (
    <Box as="section" marginTop="9" aria-labelledby="what-differs">
      <Heading level={2} look="subsection" id="what-differs" marginBottom="2">
        {texts.heading}
      </Heading>
      {fault && <Fault fault={fault} onAgain={() => void mutate()} />}
      {!comparison && !fault && <SkeletonLines lines={3} />}
      {comparison && <ComparisonLine revision={revision} comparison={comparison} />}
      {comparison?.with && changed.length === 0 && <Text isSoft>{texts.none}</Text>}
      {changed.map((row) => (
        <ChangedPart
          key={row.code}
          row={row}
          revisionId={revision.id}
          earlier={earlier?.parts.find((part) => part.code === row.code)}
          earlierLabel={comparison?.with?.label}
          // Marks are given against what buyers hold now, so against the last released revision.
          isWritable={isWritable && withId === undefined}
        />
      ))}
      <OtherLines rows={rows} />
    </Box>
  );
}
