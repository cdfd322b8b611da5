import { linkParts } from './part-links.js';

const linked = (children: object[]) => {
  const tree = { type: 'root', children: [{ type: 'paragraph', children }] };
  linkParts(tree as Parameters<typeof linkParts>[0], (code) => `#part-${code}`);
  return tree.children[0]?.children;
};

const link = (code: string) => ({
  type: 'link',
  url: `#part-${code}`,
  children: [{ type: 'text', value: code }],
});

describe('part links in Markdown', () => {
  it('become links, with the words around them kept', () => {
    expect(linked([{ type: 'text', value: 'Slide [[J-01]] into [[B-03]] firmly.' }])).toEqual([
      { type: 'text', value: 'Slide ' },
      link('J-01'),
      { type: 'text', value: ' into ' },
      link('B-03'),
      { type: 'text', value: ' firmly.' },
    ]);
  });

  it('leave code and what is no part code as it is written', () => {
    const code = [{ type: 'inlineCode', value: '[[J-01]]' }];
    expect(linked(code)).toEqual(code);
    const prose = [{ type: 'text', value: 'See [[the drawing]].' }];
    expect(linked(prose)).toEqual(prose);
  });
});
