import { plainText, type NoteBlock, type NoteSpan } from './note-blocks.js';

export interface AssemblyStep {
  readonly kind: 'step';
  /** As the maker numbered it, or its place in order; empty where only some steps have numbers. */
  readonly number: string;
  readonly title: readonly NoteSpan[];
  readonly blocks: readonly NoteBlock[];
}
/** What stands before the first step or between two of them. */
export interface BetweenSteps {
  readonly kind: 'between';
  readonly blocks: readonly NoteBlock[];
}

const ownNumber = /^\s*(?:step\s+)?(\d{1,3}[a-z]?)\s*[.):]\s*/i;

/**
 * Assembly notes in steps: each heading begins one (of the first level that is used more than once, or of the
 * first level there is); without headings, each item of the first numbered list is one.
 */
export const assemblySteps = (blocks: readonly NoteBlock[]): (AssemblyStep | BetweenSteps)[] => {
  const depth = stepDepth(blocks);
  return depth === null ? stepsOfList(blocks) : stepsOfHeadings(blocks, depth);
};

const stepDepth = (blocks: readonly NoteBlock[]): number | null => {
  const depths = blocks.flatMap((block) => (block.kind === 'heading' ? [block.depth] : [])).sort();
  const repeated = depths.find((depth, at) => depths[at + 1] === depth);
  return repeated ?? depths[0] ?? null;
};

const stepsOfHeadings = (blocks: readonly NoteBlock[], depth: number): (AssemblyStep | BetweenSteps)[] => {
  const found: (
    | { kind: 'step'; title: readonly NoteSpan[]; blocks: NoteBlock[] }
    | { kind: 'between'; blocks: NoteBlock[] }
  )[] = [];
  for (const block of blocks) {
    const last = found.at(-1);
    if (block.kind === 'heading' && block.depth === depth)
      found.push({ kind: 'step', title: block.spans, blocks: [] });
    else if (block.kind === 'heading' && block.depth < depth && last?.kind !== 'between')
      found.push({ kind: 'between', blocks: [block] });
    else if (last) last.blocks.push(block);
    else found.push({ kind: 'between', blocks: [block] });
  }
  const hasOwnNumbers = found.some((one) => one.kind === 'step' && ownNumber.test(plainText(one.title)));
  let count = 0;
  return found.map((one) => {
    if (one.kind === 'between') return one;
    count += 1;
    const own = ownNumber.exec(plainText(one.title))?.[1];
    return {
      ...one,
      number: own ?? (hasOwnNumbers ? '' : String(count)),
      title: own === undefined ? one.title : withoutNumber(one.title),
    };
  });
};

const withoutNumber = ([first, ...rest]: readonly NoteSpan[]): NoteSpan[] =>
  first ? [{ ...first, text: first.text.replace(ownNumber, '') }, ...rest] : [];

const stepsOfList = (blocks: readonly NoteBlock[]): (AssemblyStep | BetweenSteps)[] => {
  const at = blocks.findIndex((block) => block.kind === 'list' && block.start !== null);
  const list = blocks[at];
  if (list?.kind !== 'list') return blocks.length === 0 ? [] : [{ kind: 'between', blocks }];
  const between = (some: readonly NoteBlock[]): BetweenSteps[] =>
    some.length === 0 ? [] : [{ kind: 'between', blocks: some }];
  return [
    ...between(blocks.slice(0, at)),
    ...list.items.map((item, index): AssemblyStep => ({
      kind: 'step',
      number: String((list.start ?? 1) + index),
      title: [],
      blocks: item,
    })),
    ...between(blocks.slice(at + 1)),
  ];
};
