import { may } from '@windchest/contracts';
import type { SignedIn } from '../http/person.js';

/**
 * May this visitor read the whole of this post? Everybody a public one that is out, current supporters those
 * written for them, and whoever writes the journal everything.
 */
export const mayReadPost = (
  post: { readonly audience: 'everybody' | 'supporters'; readonly state: 'draft' | 'published' },
  person: Pick<SignedIn, 'role'> | null,
  isSupporter: boolean,
): boolean => {
  if (person && may(person.role, 'journal:write')) return true;
  if (post.state !== 'published') return false;
  return post.audience === 'everybody' || isSupporter;
};
