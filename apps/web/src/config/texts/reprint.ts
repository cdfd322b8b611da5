const pieces = (n: number) => `${n} ${n === 1 ? 'piece' : 'pieces'}`;

/** What to print again for another revision, and what is printed. */
export const reprintTexts = {
  title: 'What to print',
  titleFor: (label: string) => `What to print for ${label}`,
  upTo: 'For the revision',
  option: (label: string, isNewest: boolean, isWithdrawn: boolean) =>
    `${label}${isNewest ? ', the newest' : ''}${isWithdrawn ? ', withdrawn' : ''}`,
  failed: 'The list cannot be shown',
  loading: 'Comparing what you printed',

  fromRecord: (labels: string) => `From what you said you printed, of ${labels}.`,
  fromHeld: (label: string) =>
    `From ${label}, the revision you hold. Say below what you printed to be exact.`,
  fromNothing: 'Nothing of yours is known here yet, so all parts are listed.',
  nothing: (label: string) => `Nothing to print: what you have is ${label} already.`,

  breaksTitle: (from: string, to: string) => `Printed parts of ${from} do not go with ${to}`,
  breaks: (from: string, to: string) =>
    `A new mark means that parts no longer interchange. For ${to} print the whole kit anew; keep a finished ${from} as it is, and do not mix pieces of the two.`,

  part: 'Part',
  print: 'Print',
  times: (count: number) => `× ${count}`,
  noPrint: 'none',
  whatDiffers: 'What differs',
  why: 'Why',
  caption: 'What differs',
  ifItTroubles: 'Reprint if it troubles you',
  unmarked: 'The workshop does not ask for a reprint',
  spare: (count: number) => `${pieces(count)} left over`,
  step: (revision: string, reason: string) => `${revision}: ${reason}`,
  inClearance: (sign: string) => `in ${sign}`,

  getChanged: (count: number) =>
    count === 1 ? 'Get the one part that changed' : `Get the ${count} changed parts`,
  changedBuilding: 'Packing the changed parts and the notes',
  changedFailed: 'The changed parts were not packed',

  toPage: 'Plates, filament and a list to print out',
  printOut: 'Print this list',
  back: (kit: string) => `${kit} on the shelf`,
  withOptional: 'With the parts that may trouble you',
  plates: 'Plates, filament, time',
  noPrinter: 'Write your printer down, and the plates, the filament and the hours stand here.',
  writePrinter: 'Write my printer down',
  sheet: (kit: string) => `Parts of ${kit}`,
  tick: 'Done',
  blockFrom: 'You have',
  blockTo: 'For',
  blockPieces: 'Pieces',
  blockOptional: 'If they trouble',
  blockNothing: 'nothing yet',
  date: 'Written',

  build: 'Your build',
  buildLead: (printed: number, all: number, label: string) =>
    `${printed} of ${pieces(all)} of ${label} printed.`,
  buildAssumed: (label: string) =>
    `You hold ${label}, so all of it counts as printed. Say what is printed to keep the list exact.`,
  buildRevision: 'Count for',
  buildSheet: (label: string) => `Printed parts of ${label}`,
  printedOf: (printed: number, all: number) => `${printed} of ${all}`,
  pieces: 'Printed',
  more: (code: string) => `One more piece of ${code}`,
  less: (code: string) => `One piece of ${code} less`,
  moreSign: '+',
  lessSign: '−',
  all: (label: string) => `I have printed all of ${label}`,
  forget: 'Forget what I printed',
  forgetTitle: 'Forget what you printed?',
  forgetDetail: 'What you said part by part is thrown away. The revision you hold then counts as printed.',
  forgetConfirm: 'Forget it',
  forgetFailed: 'It was not forgotten',
  sayFailed: 'It was not written down',
  showParts: 'Part by part',
};
