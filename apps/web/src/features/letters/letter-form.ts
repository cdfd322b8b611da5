import type { InputOf, Letter } from '@windchest/contracts';

export type LetterForm = InputOf<'POST /workshop/letters'>['body'];
export const letterFieldNames = ['kind', 'subject', 'body', 'kitId', 'revisionId', 'perMinute'] as const;

export const emptyLetter = (perMinute: number): LetterForm => ({
  kind: 'service',
  subject: '',
  body: 'Hello {name},\n\n\n\n{reprint_list}\n\n{download_link}\n',
  kitId: null,
  revisionId: null,
  leavesOutUnneeded: true,
  perMinute,
  audience: {
    ownsKit: true,
    heldFromId: null,
    heldToId: null,
    withNothingHeld: true,
    sources: [],
    nozzlesMm: [],
    materials: [],
    reportedParts: [],
    countries: [],
    askedForNews: false,
  },
});

export const formOf = ({
  kind,
  subject,
  body,
  kitId,
  revisionId,
  audience,
  leavesOutUnneeded,
  perMinute,
}: Letter): LetterForm => ({
  kind,
  subject,
  body,
  kitId,
  revisionId,
  audience,
  leavesOutUnneeded,
  perMinute,
});

/** What asks about a kit means nothing without one. */
export const bodyOf = (form: LetterForm): LetterForm =>
  form.kitId !== null
    ? form
    : {
        ...form,
        revisionId: null,
        audience: { ...form.audience, ownsKit: false, heldFromId: null, heldToId: null, reportedParts: [] },
      };
