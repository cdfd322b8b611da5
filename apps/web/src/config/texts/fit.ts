import type { FitState, FitVerdict } from '@windchest/contracts';

export const verdictTexts: Record<FitVerdict, string> = {
  'far-too-tight': 'far too tight',
  tight: 'tight',
  right: 'right',
  loose: 'loose',
  'far-too-loose': 'far too loose',
};

export const verdictNotes: Record<FitVerdict, string> = {
  'far-too-tight': 'It does not go together.',
  tight: 'It goes together by force, or after filing.',
  right: 'It goes together as the notes say.',
  loose: 'It holds, with play or with tape.',
  'far-too-loose': 'It falls out.',
};

export const clearanceTexts = { minus: '−', zero: '0', plus: '+' };

/** As its reporter reads it. */
export const fitStateTexts: Record<FitState, string> = {
  new: 'sent',
  answered: 'answered',
  planned: 'to be mended',
  fixed: 'mended',
  closed: 'closed',
};

export const fitTexts = {
  title: 'How does a part fit?',
  lead: (kit: string, revision: string) =>
    `Say how a part of ${kit} ${revision} came out on your printer. The workshop answers, and mends what troubles many.`,
  back: 'Back to the kit',
  part: 'Part',
  choosePart: 'Choose a part',
  clearance: 'Clearance printed',
  clearances: { minus: '− (tighter)', zero: '0 (as drawn)', plus: '+ (looser)' },
  oneClearance: 'The part comes in one clearance',
  printer: 'Printer',
  printerHint: 'As you call it.',
  material: 'Material',
  materialHint: 'PLA, PETG, ASA, …',
  nozzle: 'Nozzle',
  layer: 'Layer height',
  verdict: 'How does it fit?',
  gap: 'By how much, across',
  gapHint: 'If you measured it: −0.20 for 0.20 mm too tight, 0.15 for 0.15 mm too loose.',
  words: 'In your words',
  wordsHint: 'What rubs, what wobbles, what you did about it.',
  picture: 'Picture',
  pictureHint: 'One that shows the trouble. What your camera wrote beside it stays with you.',
  send: 'Send the report',
  sending: 'Sending …',
  sent: 'Thank you. The workshop has your report; its answer comes by e-mail and stands with your reports.',
  failed: 'The report was not sent',
  pictureFailed: 'The report is sent, but its picture is not',
  caution: 'Knives and files slip: cut and file away from yourself, and keep sanding dust out of your lungs.',
  mine: 'Your reports',
  mineEmpty: 'You have reported nothing about this kit yet.',
  notThere: 'This kit is not on your shelf',
  about: (revision: string) => `about ${revision}`,
  off: (mm: string) => `${mm} across`,
  mendedIn: (label: string, isReleased: boolean) =>
    isReleased ? `Mended in ${label}.` : `To be mended in ${label}, which is not out yet.`,
  answeredBy: (name: string) => `${name}:`,
  pictureOf: (part: string) => `Your picture of ${part}`,
};
