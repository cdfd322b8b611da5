import type { InputOf, WorkshopPost } from '@windchest/contracts';

export type PostWords = InputOf<'POST /workshop/posts'>['body'];
export const postWordNames = ['title', 'slug', 'lead', 'body', 'audience', 'kitId'] as const;

export const emptyPost: PostWords = {
  title: '',
  slug: '',
  lead: '',
  body: '',
  audience: 'everybody',
  kitId: null,
};

export const wordsOf = ({ title, slug, lead, body, audience, kitId }: WorkshopPost): PostWords => ({
  title,
  slug,
  lead,
  body,
  audience,
  kitId,
});
