import { assemblySteps } from './assembly-steps.js';
import { codesIn, plainText } from './note-blocks.js';
import { readNotes } from './read-notes.js';

const steps = (markdown: string) =>
  assemblySteps(readNotes(markdown)).map((one) =>
    one.kind === 'step'
      ? `${one.number}|${plainText(one.title)}|${one.blocks.length}`
      : `between ${one.blocks.length}`,
  );

describe('assemblySteps', () => {
  it('begins a step at each heading and takes the maker’s numbers', () => {
    expect(steps('## 1. Print\n\nA.\n\n## Step 2: Clean\n\nB.\n\nC.')).toEqual(['1|Print|1', '2|Clean|2']);
  });

  it('numbers steps in their order where the maker has not', () => {
    expect(steps('## Print\n\n## Clean')).toEqual(['1|Print|0', '2|Clean|0']);
  });

  it('leaves steps without a number where only some have one', () => {
    expect(steps('## 1. Print\n\n## Aside')).toEqual(['1|Print|0', '|Aside|0']);
  });

  it('takes the first level of heading that repeats, so that a title is no step', () => {
    expect(steps('# Building it\n\nFirst words.\n\n## Print\n\n### Small\n\n## Clean')).toEqual([
      'between 2',
      '1|Print|1',
      '2|Clean|0',
    ]);
  });

  it('makes a step of each numbered point where there are no headings', () => {
    expect(steps('Before.\n\n3. Print\n4. Clean\n\nAfter.')).toEqual([
      'between 1',
      '3||1',
      '4||1',
      'between 1',
    ]);
  });

  it('has no steps for words alone, and none at all for nothing', () => {
    expect(steps('Put it together.')).toEqual(['between 1']);
    expect(steps('')).toEqual([]);
  });
});

describe('readNotes', () => {
  it('finds part codes wherever they stand, each once, in the order of the text', () => {
    const notes = readNotes(
      '## [[B-01]]\n\n- [[H-03]] and **[[A-7b]]**\n\n| x |\n| - |\n| [[H-03]] [[C-1]] |\n\n> [[Q-9]]',
    );
    expect(codesIn(notes)).toEqual(['B-01', 'H-03', 'A-7b', 'C-1', 'Q-9']);
  });

  it('leaves code and what is no part code as they are written', () => {
    const notes = readNotes('`[[H-03]]` and [[not a code]]');
    expect(codesIn(notes)).toEqual([]);
    expect(notes).toMatchObject([{ kind: 'paragraph' }]);
    expect(notes[0]?.kind === 'paragraph' && plainText(notes[0].spans)).toBe('[[H-03]] and [[not a code]]');
  });

  it('writes out the address of a link, and follows none but the web and mail', () => {
    const [first, second] = readNotes(
      'See [the page](https://example.org/a).\n\n[Run](javascript:alert(1)) it.',
    );
    expect(first?.kind === 'paragraph' && plainText(first.spans)).toBe(
      'See the page (https://example.org/a).',
    );
    expect(second?.kind === 'paragraph' && second.spans.some(({ url }) => url !== undefined)).toBe(false);
  });

  it('puts pictures below their paragraph, by file name alone, and leaves HTML out', () => {
    expect(readNotes('Look ![A row](../x/a%20row.png?2) here.\n\n<script>alert(1)</script>')).toMatchObject([
      { kind: 'paragraph' },
      { kind: 'picture', name: 'a row.png', alt: 'A row' },
    ]);
  });
});
