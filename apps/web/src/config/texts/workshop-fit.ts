import type { FitCell, FitState } from '@windchest/contracts';

export const fitStates: Record<FitState, string> = {
  new: 'unanswered',
  answered: 'answered',
  planned: 'to be mended',
  fixed: 'mended',
  closed: 'closed',
};

export const certaintyTexts: Record<FitCell['certainty'], string> = {
  sure: 'sure',
  likely: 'likely',
  unsure: 'too early to say',
};

export const fitListTexts = {
  title: 'Fit',
  lead: 'How the parts come out on printers you do not own.',
  kit: 'Kit',
  chooseKit: 'Choose a kit',
  revision: 'Revision',
  allRevisions: 'All revisions',
  matrix: 'Part by material',
  matrixCaption: 'Reports by part and material: count, median deviation, middle half, change per side',
  matrixEmpty: 'No reports about this kit yet',
  matrixEmptyDetail:
    'Buyers say on their shelf how a part fits. From three or more reports a pattern begins to show.',
  all: 'All materials',
  count: (count: number, measured: number) =>
    `${count} ${count === 1 ? 'report' : 'reports'}, ${measured} measured`,
  median: (mm: string) => `${mm} mm`,
  spread: (low: string, high: string) => `middle half ${low} to ${high} mm`,
  change: (perSide: string) => `${perSide} mm a side`,
  noChange: 'leave it as it is',
  method:
    'Median of all reports across the part; tight is minus. Where nobody measured, tight and loose count as 0.1 mm, far too tight and far too loose as 0.3 mm (common practice). “Sure” means that the 95 % interval of the median (sign test) leaves out zero, “likely” that the 80 % interval does. A side gets half of what is missing across.',
  interval: (low: string, high: string) => `95 % of the time between ${low} and ${high} mm`,
  reports: 'Reports',
  caption: 'Fit reports, newest first',
  search: 'Search in the reports',
  state: 'State',
  allStates: 'All states',
  columns: {
    part: 'Part',
    kit: 'Kit',
    fit: 'Fit',
    printed: 'Printed',
    reporter: 'By',
    state: 'State',
    at: 'Sent',
  },
  empty: 'No fit reports',
  emptyDetail: 'When somebody says how a part fits, it stands here and waits for an answer.',
};

export const fitReportTexts = {
  back: 'Fit',
  notFound: 'This report could not be read',
  title: (part: string, verdict: string) => `${part}: ${verdict}`,
  facts: {
    kit: 'Kit',
    clearance: 'Clearance',
    deviation: 'Across',
    material: 'Material',
    nozzle: 'Nozzle, layer',
    printer: 'Printer',
    reporter: 'Reported by',
    state: 'State',
    sent: 'Sent',
  },
  notMeasured: 'not measured',
  noWords: 'Nothing was written.',
  picture: (part: string) => `Picture of ${part} by its reporter`,
  answers: 'Answers',
  noAnswers: 'Nobody has answered yet.',
  answer: 'Answer',
  answerHint: 'It goes to the reporter by e-mail and stands on their shelf.',
  send: 'Send the answer',
  sending: 'Sending …',
  failed: 'The answer was not sent',
  mend: 'Mended by',
  mendHint: 'The reporter hears of it when that revision is out.',
  chooseRevision: 'Choose a later revision',
  noLater: 'There is no later revision yet. Start one on the kit’s page.',
  draft: (label: string) => `${label} (not out yet)`,
  setMend: 'Say so',
  mendFailed: 'That was not saved',
  mended: (label: string, isReleased: boolean) =>
    isReleased ? `Mended in ${label}.` : `To be mended in ${label}.`,
  close: 'Close it: no change needed',
  closeFailed: 'The report was not closed',
};
