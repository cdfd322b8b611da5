import type { Clearance } from '@windchest/contracts';

const signs: Record<Clearance, string> = { minus: '−', zero: '0', plus: '+' };
/** Clearance is a gap: with more of it a part fits looser. */
const words: Record<Clearance, string> = { minus: 'tighter', zero: 'as drawn', plus: 'looser' };

const listed = (names: readonly string[]) =>
  names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;

/** The gap that a part leaves to the one it goes into, as the shop and the workroom speak of it. */
export const clearanceTexts = {
  signs,
  words,
  named: (clearance: Clearance) => `${signs[clearance]} ${words[clearance]}`,
  all: (clearances: readonly Clearance[]) =>
    listed(clearances.map((one) => (one === 'zero' ? signs[one] : `${signs[one]} (${words[one]})`))),
  codes: (codes: readonly string[]) => listed(codes),
};
