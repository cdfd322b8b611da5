/** As much of a Markdown tree as part links need. */
export interface MarkdownNode {
  type: string;
  value?: string;
  url?: string;
  children?: MarkdownNode[];
}

const partLink = /\[\[([A-Z]{1,3}-[0-9]{1,3}[a-z]?)\]\]/g;

function split(text: string, hrefOf: (code: string) => string): MarkdownNode[] {
  const nodes: MarkdownNode[] = [];
  let from = 0;
  for (const match of text.matchAll(partLink)) {
    const code = match[1] ?? '';
    if (match.index > from) nodes.push({ type: 'text', value: text.slice(from, match.index) });
    nodes.push({ type: 'link', url: hrefOf(code), children: [{ type: 'text', value: code }] });
    from = match.index + match[0].length;
  }
  if (from < text.length) nodes.push({ type: 'text', value: text.slice(from) });
  return nodes;
}

/** `[[H-03]]` becomes a link to that part. Code is left as it is written. */
export function linkParts(node: MarkdownNode, hrefOf: (code: string) => string): void {
  if (!node.children || node.type === 'link') return;
  node.children = node.children.flatMap((child) => {
    if (child.type === 'text' && child.value?.includes('[[')) return split(child.value, hrefOf);
    linkParts(child, hrefOf);
    return [child];
  });
}
