import type { LetterBody } from '@windchest/contracts';

/** A service letter to the owners of a kit, with every switch as the page sets it. */
export const letterOf = (
  kitId: string | null,
  {
    audience,
    ...more
  }: Partial<Omit<LetterBody, 'audience'>> & { audience?: Partial<LetterBody['audience']> } = {},
): LetterBody => ({
  kind: 'service',
  subject: '{kit}: what {newest} mends',
  body: 'Hello {name},\n\nyou hold {held}.\n\n{reprint_list}\n\n{download_link}\n',
  kitId,
  revisionId: null,
  leavesOutUnneeded: true,
  perMinute: 100_000,
  ...more,
  audience: {
    ownsKit: kitId !== null,
    heldFromId: null,
    heldToId: null,
    withNothingHeld: true,
    sources: [],
    nozzlesMm: [],
    materials: [],
    reportedParts: [],
    countries: [],
    askedForNews: false,
    ...audience,
  },
});
