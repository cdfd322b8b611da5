import type { Comparison, RevisionDetail } from '@windchest/contracts';
import { useEffect, useRef } from 'react';
import { useSWRConfig } from 'swr';
import { isAnswerOf } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { meshesOf } from './part-meshes.js';
import { lookAgainMs } from './revision-context.js';

/** How many shapes there are to compare, and how many of them still wait. */
export function countedShapes(comparison: Comparison | undefined): { total: number; waiting: number } {
  const deviations = (comparison?.rows ?? []).flatMap(({ deviation }) => deviation ?? []);
  return {
    total: deviations.length,
    waiting: deviations.filter(({ state }) => state === 'waiting').length,
  };
}

/** What a comparison was made from; when it changes, the comparison is old. */
const fingerprint = ({ parts }: RevisionDetail) =>
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

/** A revision beside an earlier one (the last released, unless told); read again while shapes are being compared. */
export function useComparison(revision: RevisionDetail, withId?: string) {
  const { mutate: mutateAll } = useSWRConfig();
  const answer = useEndpoint(
    'GET /workshop/revisions/:revisionId/comparison',
    { params: { revisionId: revision.id }, query: { with: withId } },
    {
      keepPreviousData: true,
      refreshInterval: (now) => (countedShapes(now).waiting > 0 ? lookAgainMs : 0),
    },
  );
  const { data, mutate } = answer;
  const made = fingerprint(revision);
  const lastMade = useRef(made);
  useEffect(() => {
    if (made === lastMade.current) return;
    lastMade.current = made;
    void mutate();
  }, [made, mutate]);

  const { waiting } = countedShapes(data);
  const lastWaiting = useRef(waiting);
  useEffect(() => {
    // The gates wait for the last shape too.
    if (waiting === 0 && lastWaiting.current > 0)
      void mutateAll(isAnswerOf(['GET /workshop/revisions/:revisionId']));
    lastWaiting.current = waiting;
  }, [waiting, mutateAll]);
  return answer;
}
