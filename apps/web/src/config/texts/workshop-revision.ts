import type { Gate } from '@windchest/contracts';

export const revisionTexts = {
  title: (kit: string, label: string) => `${kit} ${label}`,
  states: { draft: 'draft', proving: 'in proof', released: 'released', withdrawn: 'withdrawn' },
  tabs: {
    label: 'Revision',
    parts: 'Parts',
    notes: 'Assembly notes',
    specification: 'Print specification',
    changes: 'Change notes',
    files: 'Files',
  },
  final: (label: string, released: string) =>
    `${label} was released on ${released}. A released revision never changes: people have printed it. A mistake is mended by a new revision.`,
  withdrawn: (label: string, reason: string) =>
    `${label} was withdrawn and can no longer be changed. ${reason}`,
  toKit: 'Start the next revision',
  noWriting: 'Your role reads revisions; makers change them.',
  aside: 'Release',
  toRelease: (label: string) => `What ${label} waits for`,
  notFound: 'The revision could not be read',
};

export const gateTexts = {
  heading: 'Before it can be released',
  headingReleased: 'What it was released with',
  names: {
    'parts-measured': 'Every part measured',
    watertight: 'Watertight',
    'fits-build-volume': 'Fits the build volume',
    'voices-in-tune': 'Voices in tune',
    'assembly-notes': 'Assembly notes',
    'change-notes': 'Change notes',
    'changes-marked': 'Changed parts marked',
    cautions: 'Cautions',
    'licence-and-price': 'Licence and price',
    'proof-round': 'Proof round',
  } satisfies Record<Gate['name'], string>,
  states: { passed: 'passed', open: 'open', waived: 'waived', 'not-needed': 'not needed' } satisfies Record<
    Gate['state'],
    string
  >,
  waivedBy: (who: string, when: string, why: string) => `${who} waived it on ${when}: ${why}`,
  waivedOther: (who: string, when: string, why: string, against: string) =>
    `${who} waived something else on ${when} (${against}): ${why}`,
  waiverNeedless: (who: string, when: string) => `The waiver of ${who}, ${when}, is no longer needed.`,
  waive: 'Waive',
  waiveOf: (gate: string) => `Waive the gate “${gate}”`,
  takeBack: 'Take back',
  takeBackOf: (gate: string) => `Take the waiver of “${gate}” back`,
};

export const waiverTexts = {
  title: (gate: string) => `Waive “${gate}”?`,
  what: (label: string) =>
    `${label} may then be released although this gate is open. The waiver covers what the gate says now: if that changes, the gate opens again.`,
  reason: 'Why it may go out like this',
  reasonHint:
    'At least 10 characters. The workshop keeps it with the revision and in its log; buyers do not see it.',
  waive: 'Waive the gate',
  failed: 'The gate was not waived',
  takeBackAsk: (gate: string) => `Take the waiver of “${gate}” back?`,
  takeBackOpens: 'The gate opens again, and the written reason is lost.',
  takeBackNeedless: 'Nothing needs it any more. The written reason is lost.',
  takeBack: 'Take it back',
  takeBackFailed: 'The waiver was not taken back',
};

const spelled = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

export const releaseTexts = {
  holders: (kit: string) => `Holders of ${kit}`,
  toReprint: 'Will be told to reprint',
  parts: (count: number) => `${count} ${count === 1 ? 'part' : 'parts'}`,
  release: (label: string) => `Release ${label}`,
  gatesOpen: (label: string, count: number) =>
    `Release ${label} — ${spelled[count] ?? count} ${count === 1 ? 'gate' : 'gates'} open`,
  notAllowed: (label: string) => `${label} is released by a maker`,
  ask: (kit: string, label: string) => `Release ${label} of ${kit}?`,
  what: (label: string, holders: string) =>
    `The gates are checked once more and the bundle is built. Then ${label} is the newest revision: it is on sale, and the shelf tells ${holders} what to reprint.`,
  waived: (gates: readonly string[]) =>
    `It goes out with ${gates.length === 1 ? 'one gate' : `${gates.length} gates`} waived: ${gates.join(', ')}.`,
  final: (label: string) =>
    `${label} cannot be changed after that, nor taken back. A mistake is mended by a new revision.`,
  holdersCounted: (count: number) => (count === 1 ? 'its one holder' : `its ${count} holders`),
  holdersUnknown: 'those who hold the kit',
  keep: 'Not yet',
  waiting: 'Waiting for its turn',
  building: 'Building the bundle',
  failed: (label: string) => `${label} was not released`,
  released: 'Released',
  bundle: 'Bundle',
  partsName: 'Parts',
  noBundle: '—',
};

export const throwAwayTexts = {
  ask: (label: string) => `Throw the draft ${label} away?`,
  what: 'Its parts, notes and specification are lost. Files that other revisions use stay. This cannot be taken back.',
  open: 'Throw the draft away',
  confirm: (label: string) => `Throw ${label} away`,
  failed: 'The draft was not thrown away',
};
