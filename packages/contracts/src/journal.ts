/** The maker's posts: public ones and those for supporters; and the feeds. */
import { z } from 'zod';
import { endpoint } from './endpoint.js';
import {
  filamentColour,
  id,
  idParams,
  line,
  moment,
  pageOf,
  pageQuery,
  prose,
  slug,
  slugParams,
} from './values.js';

export const postAudience = z.enum(['everybody', 'supporters']);
export const postState = z.enum(['draft', 'published']);

const postKit = z.object({ slug, name: z.string(), colour: filamentColour });

export const postCard = z.object({
  slug,
  title: z.string(),
  lead: z.string(),
  audience: postAudience,
  publishedAt: moment,
  kit: postKit.nullable(),
  /** Whether the one who asks may read the whole of it. */
  mayRead: z.boolean(),
});
export type PostCard = z.output<typeof postCard>;

/** `body` is null for one who may not read it. Pictures stand in it as `![words](picture:<id>)`. */
export const post = postCard.extend({ body: z.string().nullable() });
export type Post = z.output<typeof post>;

export const workshopPostRow = z.object({
  id,
  slug,
  title: z.string(),
  audience: postAudience,
  state: postState,
  kitName: z.string().nullable(),
  publishedAt: moment.nullable(),
  updatedAt: moment,
});
export const postPicture = z.object({ id, fileName: z.string(), bytes: z.int() });
export const workshopPost = workshopPostRow.extend({
  lead: z.string(),
  body: z.string(),
  kitId: id.nullable(),
  pictures: z.array(postPicture),
});
export type WorkshopPost = z.output<typeof workshopPost>;

export const postBody = z.object({
  title: line.max(120),
  slug,
  lead: z.string().trim().max(300),
  body: prose,
  audience: postAudience,
  kitId: id.nullable(),
});

const inPost = idParams('postId');

export const journalEndpoints = {
  'GET /journal': endpoint({
    access: 'public',
    summary: 'Published posts, newest first',
    query: pageQuery.extend({ size: z.coerce.number().int().min(1).max(50).default(10) }),
    response: pageOf(postCard),
  }),
  'GET /journal/:slug': endpoint({
    access: 'public',
    summary: 'One published post; without its body for those who may not read it',
    params: slugParams,
    response: post,
  }),
  'GET /journal/pictures/:pictureId': endpoint({
    access: 'public',
    summary: 'A picture of a post one may read, or of a draft for those who write it',
    params: idParams('pictureId'),
    response: 'stream',
  }),
  'GET /journal.atom': endpoint({
    access: 'public',
    summary: 'The journal as an Atom feed (RFC 4287)',
    response: 'stream',
  }),
  'GET /kits/:slug/revisions.atom': endpoint({
    access: 'public',
    summary: 'New revisions of a kit as an Atom feed (RFC 4287)',
    params: slugParams,
    response: 'stream',
  }),
  'GET /workshop/posts': endpoint({
    access: 'journal:write',
    summary: 'All posts, drafts too',
    query: pageQuery,
    response: pageOf(workshopPostRow),
  }),
  'POST /workshop/posts': endpoint({
    access: 'journal:write',
    summary: 'Draft a post',
    body: postBody,
    response: workshopPost,
    status: 201,
  }),
  'GET /workshop/posts/:postId': endpoint({
    access: 'journal:write',
    summary: 'One post with its pictures',
    params: inPost,
    response: workshopPost,
  }),
  'PUT /workshop/posts/:postId': endpoint({
    access: 'journal:write',
    summary: 'Change a draft; a published post takes the right to publish',
    params: inPost,
    body: postBody,
    response: workshopPost,
  }),
  'DELETE /workshop/posts/:postId': endpoint({
    access: 'journal:publish',
    summary: 'Delete a post with its pictures',
    params: inPost,
    response: null,
    status: 204,
  }),
  'POST /workshop/posts/:postId/publication': endpoint({
    access: 'journal:publish',
    summary: 'Publish a draft',
    params: inPost,
    response: workshopPost,
  }),
  'DELETE /workshop/posts/:postId/publication': endpoint({
    access: 'journal:publish',
    summary: 'Take a post back; it becomes a draft again',
    params: inPost,
    response: workshopPost,
  }),
  'POST /workshop/posts/:postId/pictures': endpoint({
    access: 'journal:write',
    summary: 'Send a picture (multipart field `picture`): PNG, JPEG or WebP up to 8 MiB',
    params: inPost,
    response: postPicture,
    status: 201,
  }),
  'DELETE /workshop/posts/:postId/pictures/:pictureId': endpoint({
    access: 'journal:write',
    summary: 'Take a picture out of a post',
    params: idParams('postId', 'pictureId'),
    response: null,
    status: 204,
  }),
};
