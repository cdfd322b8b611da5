import type { Span } from '../../typesetting/text-lines.js';

/** Notes as they are set: Markdown with its part codes found, pictures on their own, HTML left out. */
export type NoteBlock =
  | { readonly kind: 'heading'; readonly depth: number; readonly spans: readonly NoteSpan[] }
  | { readonly kind: 'paragraph'; readonly spans: readonly NoteSpan[] }
  | {
      readonly kind: 'list';
      readonly start: number | null;
      readonly items: readonly (readonly NoteBlock[])[];
    }
  | { readonly kind: 'quote'; readonly blocks: readonly NoteBlock[] }
  | { readonly kind: 'code'; readonly text: string }
  | { readonly kind: 'table'; readonly rows: readonly (readonly (readonly NoteSpan[])[])[] }
  | { readonly kind: 'picture'; readonly name: string; readonly alt: string }
  | { readonly kind: 'rule' };

export interface NoteSpan extends Span {
  /** Of the part that is mentioned. */
  readonly code?: string;
}

/** The parts a note speaks of, each once, in the order of the text. */
export const codesIn = (blocks: readonly NoteBlock[]): string[] => {
  const codes = new Set<string>();
  const visit = (block: NoteBlock): void => {
    switch (block.kind) {
      case 'heading':
      case 'paragraph':
        addAll(block.spans);
        return;
      case 'list':
        block.items.flat().forEach(visit);
        return;
      case 'quote':
        block.blocks.forEach(visit);
        return;
      case 'table':
        block.rows.flat().forEach(addAll);
        return;
      default:
    }
  };
  const addAll = (spans: readonly NoteSpan[]): void => {
    for (const { code } of spans) if (code !== undefined) codes.add(code);
  };
  blocks.forEach(visit);
  return [...codes];
};

export const plainText = (spans: readonly Span[]): string =>
  spans
    .map(({ text }) => text)
    .join('')
    .replaceAll(/\s+/g, ' ')
    .trim();
