import { lazy, Suspense } from 'react';
import { SkeletonLines } from './skeleton-lines.js';
import type { MarkdownBodyProps } from './markdown-body.js';

const MarkdownBody = lazy(async () => ({ default: (await import('./markdown-body.js')).MarkdownBody }));

export type MarkdownProps = MarkdownBodyProps;

/** Markdown as the maker wrote it. The reader of it is loaded when first needed. */
export const Markdown = (props: MarkdownProps) => (
  <Suspense fallback={<SkeletonLines lines={4} />}>
    <MarkdownBody {...props} />
  </Suspense>
);
