import type { DemoLetter } from './demo-types.js';

/** Who asked for the news of the workshop. */
export const newsReaders: string[] = ['pia.lund@mail.example', 'jonas.abara@mail.example'];

/** News that went out, and a draft about Curlew's new tongues that waits for the maker. */
export const letters: DemoLetter[] = [
  {
    kind: 'news',
    subject: 'A bittern on the drawing board',
    kitSlug: null,
    isSent: true,
    body: `Hello {name},

the next kit is a low one: a vessel for two hands that sounds A3 with all its holes closed.

- The **volume** was right at the first print.
- The **windway** took three tries; 0.9 mm it is.
- The **third hole** still wanders.

It goes to testers when it stays where it is put. Pictures and measures are in the
[journal](/journal/on-the-drawing-board-a-bittern).

Tamsin
`,
  },
  {
    kind: 'service',
    subject: '{kit}: what {newest} mends',
    kitSlug: 'curlew',
    isSent: false,
    body: `Hello {name},

you hold {held} of {kit}. Some of you found that parts of it sit too tight; {newest} mends them. On your build,
these are to be printed again:

{reprint_list}

{download_link}

Everything else stays as it is.

Tamsin
`,
  },
];
