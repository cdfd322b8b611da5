import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail } from '@windchest/contracts';
import { releaseTexts } from '../../config/texts/workshop-revision.js';
import { bytes, date, number } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { TitleBlock, type TitleBlockField } from '../../ui/title-block.js';
import { ReleaseAction } from './release-action.js';
import { useComparison } from './use-comparison.js';

/** How many people are entitled to a kit; undefined while it is not known, or not theirs to know. */
export function useHolderCount(kitId: string): number | undefined {
  const { may } = useSession();
  const { data } = useEndpoint(
    'GET /workshop/holders',
    may('buyers:read') ? { query: { kitId, size: 1 } } : null,
  );
  return data?.total;
}

/** The foot of the column: how many it concerns, and the release itself. */
export function ReleaseBlock({ revision }: { revision: RevisionDetail }) {
  const holders = useHolderCount(revision.kit.id);
  const isDraft = revision.state === 'draft' || revision.state === 'proving';
  const { data: comparison } = useComparison(revision);
  const toReprint = comparison?.rows.filter((row) => row.mark === 'reprint needed').length;
  const fields: TitleBlockField[] = [
    {
      name: releaseTexts.holders(revision.kit.name),
      value: holders === undefined ? releaseTexts.noBundle : number(holders),
    },
    {
      name: releaseTexts.toReprint,
      value: toReprint === undefined ? releaseTexts.noBundle : releaseTexts.parts(toReprint),
    },
    ...(isDraft
      ? []
      : [
          {
            name: releaseTexts.released,
            value: revision.releasedAt ? date(revision.releasedAt) : releaseTexts.noBundle,
          },
          {
            name: releaseTexts.bundle,
            value: revision.bundle ? bytes(revision.bundle.bytes) : releaseTexts.noBundle,
          },
        ]),
  ];
  return (
    <Box position={{ lg: 'sticky' }} bottom="0">
      <TitleBlock
        columns={2}
        fields={fields}
        action={isDraft ? <ReleaseAction revision={revision} holders={holders} /> : undefined}
      />
    </Box>
  );
}
