import type { MarkdownNode } from './part-links.js';

const SCHEME = 'picture:';

/** `![words](picture:id)` becomes the address of that picture, before what is foreign is taken out. */
export function placePictures(node: MarkdownNode, srcOf: (id: string) => string): void {
  if (node.type === 'image' && node.url?.startsWith(SCHEME)) node.url = srcOf(node.url.slice(SCHEME.length));
  for (const child of node.children ?? []) placePictures(child, srcOf);
}
