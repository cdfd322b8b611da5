import type { Nodes, PhrasingContent, RootContent } from 'mdast';
import { fromMarkdown } from 'mdast-util-from-markdown';
import { gfmFromMarkdown } from 'mdast-util-gfm';
import { gfm } from 'micromark-extension-gfm';
import type { NoteBlock, NoteSpan } from './note-blocks.js';
import type { Face } from '../../typesetting/typeface-files.js';

/** Reads notes as the shop's pages do: CommonMark with GitHub's tables and task lists. */
export const readNotes = (markdown: string): NoteBlock[] => {
  const tree = fromMarkdown(markdown, { extensions: [gfm()], mdastExtensions: [gfmFromMarkdown()] });
  return tree.children.flatMap(blocksOf);
};

const blocksOf = (node: RootContent): NoteBlock[] => {
  switch (node.type) {
    case 'heading':
      return [{ kind: 'heading', depth: node.depth, spans: spansOf(node.children) }];
    case 'paragraph':
      return paragraphsOf(node.children);
    case 'list':
      return [
        {
          kind: 'list',
          start: node.ordered ? (node.start ?? 1) : null,
          items: node.children.map((item) => item.children.flatMap(blocksOf)),
        },
      ];
    case 'blockquote':
      return [{ kind: 'quote', blocks: node.children.flatMap(blocksOf) }];
    case 'code':
      return [{ kind: 'code', text: node.value }];
    case 'table':
      return [
        {
          kind: 'table',
          rows: node.children.map((row) => row.children.map((cell) => spansOf(cell.children))),
        },
      ];
    case 'footnoteDefinition':
      return node.children.flatMap(blocksOf);
    case 'thematicBreak':
      return [{ kind: 'rule' }];
    default:
      return [];
  }
};

/** A picture within a paragraph stands below it, on its own. */
const paragraphsOf = (nodes: readonly PhrasingContent[]): NoteBlock[] => {
  const spans = spansOf(nodes);
  const pictures = nodes.flatMap(picturesIn);
  const hasWords = spans.some(({ text }) => text.trim() !== '');
  return [...(hasWords ? [{ kind: 'paragraph' as const, spans }] : []), ...pictures];
};

const picturesIn = (node: Nodes): NoteBlock[] => {
  if (node.type === 'image')
    return [{ kind: 'picture', name: fileNameOf(node.url), alt: (node.alt ?? '').trim() }];
  return 'children' in node ? node.children.flatMap(picturesIn) : [];
};

const fileNameOf = (url: string): string => {
  const last =
    url
      .replace(/[?#].*$/, '')
      .split('/')
      .at(-1) ?? '';
  try {
    return decodeURIComponent(last);
  } catch {
    return last;
  }
};

interface Look {
  readonly face?: Face;
  readonly url?: string;
}

const spansOf = (nodes: readonly PhrasingContent[], look: Look = {}): NoteSpan[] =>
  nodes.flatMap((node): NoteSpan[] => {
    switch (node.type) {
      case 'text':
        return withCodes(node.value.replaceAll(/\s*\n\s*/g, ' '), look);
      case 'strong':
        return spansOf(node.children, { ...look, face: 'semibold' });
      case 'emphasis':
        return spansOf(node.children, { face: 'italic', ...look });
      case 'delete':
        return spansOf(node.children, look);
      case 'inlineCode':
        return [{ text: node.value, ...look }];
      case 'break':
        return [{ text: '\n', ...look }];
      case 'link':
        return linked(node.url, node.children, look);
      case 'linkReference':
        return spansOf(node.children, look);
      default:
        return [];
    }
  });

/** On paper a link is no use unless its address is written out. */
const linked = (url: string, children: readonly PhrasingContent[], look: Look): NoteSpan[] => {
  if (!/^(https?|mailto):/i.test(url)) return spansOf(children, look);
  const spans = spansOf(children, { ...look, url });
  const shown = url.replace(/^mailto:/i, '');
  const words = spans.map(({ text }) => text).join('');
  return words === shown || words === url ? spans : [...spans, { ...look, text: ` (${shown})`, url }];
};

const partCode = /\[\[([A-Z]{1,3}-[0-9]{1,3}[a-z]?)\]\]/;

const withCodes = (text: string, look: Look): NoteSpan[] =>
  text.split(partCode).flatMap((piece, at): NoteSpan[] => {
    if (piece === '') return [];
    // Every second piece is what the brackets held.
    return at % 2 === 0
      ? [{ ...look, text: piece }]
      : [{ ...look, text: piece, face: 'semibold', code: piece }];
  });
