/** Taking a released revision back. */
export const withdrawalTexts = {
  withdraw: (label: string) => `Withdraw ${label}`,
  title: (kit: string, label: string) => `Withdraw ${label} of ${kit}?`,
  counting: 'Counting who holds it …',
  holders: (count: number) =>
    count === 0
      ? 'Nobody holds it.'
      : `${count} ${count === 1 ? 'person holds it and gets' : 'people hold it and each gets'} one e-mail with your reason.`,
  fallsBack: (label: string, other: string) =>
    `Nobody can fetch ${label} any more. The shop offers ${other}.`,
  offSale: (kit: string, label: string) =>
    `Nobody can fetch ${label} any more. No other revision of ${kit} stands: the kit goes off sale until one is released.`,
  final: 'This cannot be taken back; a mended revision is a new one.',
  reason: 'What is wrong with it',
  reasonHint: 'Readers see this sentence on the shelf, in the e-mail, and when they try to fetch it.',
  failed: 'It was not withdrawn',
  withdrawn: 'Withdrawn',
};
