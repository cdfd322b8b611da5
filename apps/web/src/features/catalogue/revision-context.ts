import type { RevisionDetail } from '@windchest/contracts';
import { useOutletContext } from 'react-router-dom';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { useSession } from '../../lib/session.js';
import { filesOfParts } from './part-meshes.js';
import { progressOf } from './upload/upload-item.js';
import { useUploads } from './upload/uploads.js';

export interface RevisionContext {
  revision: RevisionDetail;
  /** A draft in the hands of somebody who may change it. */
  isWritable: boolean;
}

/** The revision whose tab this is. */
export const useRevision = () => useOutletContext<RevisionContext>();

/** Asked again while something goes on: this often, in ms. */
export const lookAgainMs = 1500;

/** What is old once a part or its files were changed. */
export const staleByParts = [
  'GET /workshop/revisions/:revisionId',
  'GET /workshop/revisions/:revisionId/comparison',
] as const;

const isUnmeasured = (revision: RevisionDetail) =>
  filesOfParts(revision.parts).some(({ measuring }) => measuring === 'waiting' || measuring === 'measuring');

export const isBeingReleased = ({ release }: Pick<RevisionDetail, 'release'>) =>
  release.state === 'waiting' || release.state === 'building';

/** Reads a revision, and reads it again while it is uploaded to, measured or released. */
export function useRevisionDetail(revisionId: string) {
  const { items } = useUploads(revisionId);
  const isBusy = progressOf(items).isBusy;
  const answer = useEndpoint(
    'GET /workshop/revisions/:revisionId',
    { params: { revisionId } },
    {
      refreshInterval: (now) =>
        isBusy || (now && (isUnmeasured(now) || isBeingReleased(now))) ? lookAgainMs : 0,
    },
  );
  return { ...answer, uploaded: items.length > 0 && !isBusy ? items : undefined };
}

export function useIsWritable(revision: RevisionDetail | undefined): boolean {
  const { may } = useSession();
  return Boolean(
    revision &&
    (revision.state === 'draft' || revision.state === 'proving') &&
    !isBeingReleased(revision) &&
    may('revisions:write'),
  );
}
