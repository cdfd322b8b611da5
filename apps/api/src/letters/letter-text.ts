import { wrapText } from '@windchest/emails';
import type { PhrasingContent, RootContent } from 'mdast';
import type { Writing } from './letter-html.js';

/** Markdown's blocks as the text alternative: no signs that only a machine needs, links whole and readable. */
export const blockText = (node: RootContent, writing: Writing): string => {
  const spans = (children: readonly PhrasingContent[]): string => spansText(children, writing);
  const inside = (children: readonly RootContent[]): string =>
    children
      .map((child) => blockText(child, writing))
      .filter((text) => text !== '')
      .join('\n\n');
  switch (node.type) {
    case 'paragraph':
      return wrapped(spans(node.children));
    case 'heading': {
      const text = wrapText(spans(node.children));
      return `${text}\n${'-'.repeat(Math.max(...text.split('\n').map((line) => line.length)))}`;
    }
    case 'list':
      return node.children
        .map((item, at) => {
          const sign = node.ordered ? `${(node.start ?? 1) + at}. ` : '- ';
          const hang = ' '.repeat(sign.length);
          return `${sign}${inside(item.children).replaceAll('\n', `\n${hang}`)}`;
        })
        .join('\n');
    case 'blockquote':
      return inside(node.children).replace(/^/gm, '> ');
    case 'code':
      return node.value.replace(/^/gm, '    ');
    case 'thematicBreak':
      return '* * *';
    case 'table':
      return node.children
        .map((row) => wrapText(row.children.map((cell) => spans(cell.children)).join(' | ')))
        .join('\n');
    case 'html':
      return wrapped(writing.fill(node.value));
    default:
      return '';
  }
};

/** Addresses longer than a line must not be cut: each gets a line of its own. */
const wrapped = (text: string): string =>
  text
    .split(/\n| (?=<https?:)|(?<=>) /)
    .map((line) => (/^<?https?:\S+$/.test(line) ? line : wrapText(line)))
    .join('\n');

const spansText = (children: readonly PhrasingContent[], writing: Writing): string =>
  children.map((child) => spanText(child, writing)).join('');

const spanText = (node: PhrasingContent, writing: Writing): string => {
  switch (node.type) {
    case 'text':
      return writing.fill(node.value).replaceAll('\n', ' ');
    case 'html':
    case 'inlineCode':
      return node.value;
    case 'break':
      return '\n';
    case 'image':
      return node.alt ?? '';
    case 'link': {
      const label = spansText(node.children, writing);
      const link = writing.linkOf(node.url)?.replace(/^mailto:/, '');
      return !link || link === label ? label : `${label} <${link}>`;
    }
    default:
      return 'children' in node ? spansText(node.children, writing) : '';
  }
};
