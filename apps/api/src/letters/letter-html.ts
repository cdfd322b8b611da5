import { escapeHtml, escapeLink, mailStyles as styles } from '@windchest/emails';
import type { PhrasingContent, RootContent } from 'mdast';

/** What the writers of a letter's words need to know of where they write. */
export interface Writing {
  /** Fills fields and frees part codes of their brackets; the result is plain text. */
  readonly fill: (text: string) => string;
  /** A link as it may go out, or null for one that may not. */
  readonly linkOf: (address: string) => string | null;
  /** A picture's address, where it is one of the shop's own over https. */
  readonly pictureOf: (address: string) => string | null;
}

/** Markdown's blocks as the HTML of a mail. Raw HTML is shown as text, so that nothing of it can act. */
export const blockHtml = (node: RootContent, writing: Writing): string => {
  const inside = (children: readonly RootContent[]): string =>
    children.map((child) => blockHtml(child, writing)).join('\n');
  const spans = (children: readonly PhrasingContent[]): string => spansHtml(children, writing);
  switch (node.type) {
    case 'paragraph':
      return `<p class="w-ink" style="${styles.paragraph}">${spans(node.children)}</p>`;
    case 'heading': {
      const level = node.depth <= 2 ? 2 : 3;
      return `<h${level} class="w-ink" style="${level === 2 ? styles.subheading : styles.minorHeading}">${spans(node.children)}</h${level}>`;
    }
    case 'list': {
      const tag = node.ordered ? 'ol' : 'ul';
      const start = node.ordered && node.start && node.start !== 1 ? ` start="${node.start}"` : '';
      const items = node.children.map(
        (item) => `<li class="w-ink" style="${styles.listItem}">${tight(item.children, writing)}</li>`,
      );
      return `<${tag}${start} class="w-ink" style="${styles.list}">${items.join('')}</${tag}>`;
    }
    case 'blockquote':
      return `<blockquote class="w-rule" style="${styles.quote}">${inside(node.children)}</blockquote>`;
    case 'code':
      return `<pre class="w-ink" style="${styles.code}">${escapeHtml(node.value)}</pre>`;
    case 'thematicBreak':
      return `<hr class="w-hairline" style="${styles.rule}">`;
    case 'table': {
      const rows = node.children.map((row, at) => {
        const tag = at === 0 ? 'th scope="col" align="left"' : 'td';
        const cells = row.children.map(
          (cell) =>
            `<${tag} class="${at === 0 ? 'w-soft w-rule' : 'w-ink w-hairline'}" style="${at === 0 ? styles.columnHead : styles.cell};padding-right:16px">${spans(cell.children)}</${tag.split(' ')[0]}>`,
        );
        return `<tr>${cells.join('')}</tr>`;
      });
      return `<table width="100%" cellpadding="0" cellspacing="0" border="0" style="margin:0 0 20px">${rows.join('')}</table>`;
    }
    case 'html':
      return `<p class="w-ink" style="${styles.paragraph}">${escapeHtml(writing.fill(node.value))}</p>`;
    default:
      return '';
  }
};

/** A list's item of one paragraph stands without a paragraph's spacing. */
const tight = (children: readonly RootContent[], writing: Writing): string => {
  const [only] = children;
  return children.length === 1 && only?.type === 'paragraph'
    ? spansHtml(only.children, writing)
    : children.map((child) => blockHtml(child, writing)).join('\n');
};

const spansHtml = (children: readonly PhrasingContent[], writing: Writing): string =>
  children.map((child) => spanHtml(child, writing)).join('');

const spanHtml = (node: PhrasingContent, writing: Writing): string => {
  const inside = (children: readonly PhrasingContent[]): string => spansHtml(children, writing);
  switch (node.type) {
    case 'text':
      return escapeHtml(writing.fill(node.value));
    case 'html':
      return escapeHtml(node.value);
    case 'emphasis':
      return `<em>${inside(node.children)}</em>`;
    case 'strong':
      return `<strong>${inside(node.children)}</strong>`;
    case 'delete':
      return `<s>${inside(node.children)}</s>`;
    case 'inlineCode':
      return `<code>${escapeHtml(node.value)}</code>`;
    case 'break':
      return '<br>';
    case 'link': {
      const link = writing.linkOf(node.url);
      return link
        ? `<a class="w-ink" href="${link.startsWith('mailto:') ? escapeHtml(link) : escapeLink(link)}" style="${styles.link}">${inside(node.children)}</a>`
        : inside(node.children);
    }
    case 'image': {
      const source = writing.pictureOf(node.url);
      return source
        ? `<img src="${escapeLink(source)}" alt="${escapeHtml(node.alt ?? '')}" width="526" style="${styles.picture}">`
        : escapeHtml(node.alt ?? '');
    }
    default:
      return 'children' in node ? inside(node.children) : '';
  }
};
