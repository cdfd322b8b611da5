/** Parts in several clearances, as the workshop makes them. */
export const variantTexts = {
  heading: 'Clearances',
  hint: 'The file of the part is 0. Where some printers make it too tight or too loose, give it a file with less of a gap (−, tighter) or with more (+, looser). A file dropped on the page with (minus) or (plus) behind its code does the same.',
  send: 'Send a file',
  replace: 'Send another',
  forClearance: (named: string) => `for ${named}`,
  sending: (fileName: string) => `Sending ${fileName} …`,
  take: (named: string) => `Or take for ${named} a mesh that is here`,
  choose: 'Choose a mesh',
  takeAsk: (from: string, code: string, sign: string) => `Make ${from} the clearance ${sign} of ${code}?`,
  takeWhat: (from: string, fileName: string) =>
    `${fileName} is then a clearance and no part by itself: ${from} is dropped, with its settings and its voice.`,
  takeConfirm: (code: string, sign: string) => `Make it ${code} ${sign}`,
  out: 'Take out',
  outOf: (code: string, sign: string) => `Take ${code} ${sign} out`,
  outAsk: (code: string, sign: string) => `Take ${code} ${sign} out?`,
  outWhat: (code: string) =>
    `Its file is taken out of this draft. ${code} itself stays, and so do earlier revisions.`,
  failed: 'The clearance was not changed',
};
