import type { DemoPost } from './demo-types.js';

/** What the maker has written of the bench; the second one is for supporters. */
export const posts: DemoPost[] = [
  {
    title: 'How a pipe is voiced on a kitchen table',
    slug: 'voiced-on-a-kitchen-table',
    lead: 'Eight stopped pipes, one tuner and a sheet of 240-grit paper: an evening with Curlew.',
    audience: 'everybody',
    kitSlug: 'curlew',
    body: `A stopped pipe that comes off the printer is nearly always a little flat, and that is meant: paper takes
length away, nothing puts it back.

1. Let the pipe and the room come to one temperature. Ten minutes will do.
2. Blow it as you would blow it in the rank, not as a whistle.
3. Read the tuner three times and take the middle reading.
4. Push the stopper in by half of what the tuner says, then read again.

Two things surprised me. The **lowest** pipes want the least work, though they look the most forbidding. And
warm hands sharpen a small pipe by several cents before one has even begun to listen.
`,
  },
  {
    title: 'On the drawing board: a bittern',
    slug: 'on-the-drawing-board-a-bittern',
    lead: 'A low vessel for two hands, and why its third hole will not stay where I put it.',
    audience: 'supporters',
    kitSlug: null,
    body: `The next vessel wants to be low: A3 with all holes closed. That is a little over a litre of air, and a
wall that two hands can hold.

- **First print**: the volume was right within one percent, the pitch was not. The windway was too wide and the
  note sat on the edge between two.
- **Second print**: windway 0.9 mm instead of 1.2 mm. It speaks at once.
- **Third print**, still on the bed as I write: the third hole moves 6 mm towards the thumb.

If it speaks on Sunday I shall ask a few of you, with printers that differ from mine, to prove it.
`,
  },
];
