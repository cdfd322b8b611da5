import { Refusal } from '../../http/refusal.js';

const MAX_CHARACTERS = 150;
const WINDOWS_DEVICE = /^(con|prn|aux|nul|com[0-9¹²³]|lpt[0-9¹²³])(\.|$)/i;
/** Marks that turn the reading direction, and signs without width: a name would not show what it is. */
const UNSEEN = /[\u00ad\u061c\u180e\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff\ufff9-\ufffb]/;
// eslint-disable-next-line no-control-regex
const CONTROL = /[\u0000-\u001f\u007f-\u009f]/;

/**
 * The name a file is kept under: the given one in its composed form. Names go into bundles that are unpacked
 * on every kind of machine, so whatever one of them would read as something else is refused, not repaired.
 * @throws Refusal `file-refused` with a sentence that names the fault
 */
export const safeFileName = (given: string): string => {
  const name = given.normalize('NFC').trim();
  const refuse = (fault: string): Refusal => new Refusal('file-refused', `“${shown(given)}” ${fault}`);
  if (name === '') throw new Refusal('file-refused', 'A file without a name was sent. Give it one.');
  if (CONTROL.test(name)) throw refuse('has a control character in its name. Rename it.');
  if (UNSEEN.test(name))
    throw refuse('has an invisible sign or one that turns the reading direction in its name. Rename it.');
  if (/^[A-Za-z]:/.test(name) || /^[\\/]/.test(name))
    throw refuse('carries an absolute path in its name. Send the bare file name.');
  if (/(^|[\\/])\.\.([\\/]|$)/.test(name))
    throw refuse('climbs out of its folder with “..” in its name. Send the bare file name.');
  if (/[\\/]/.test(name)) throw refuse('carries a path in its name. Send the bare file name.');
  if (/[<>:"|?*]/.test(name))
    throw refuse('has one of < > : " | ? * in its name, which not every disk can keep. Rename it.');
  if (WINDOWS_DEVICE.test(name)) throw refuse('is named like a device of Windows. Rename it.');
  if (/^[.~-]/.test(name)) throw refuse('begins with a dot, a tilde or a hyphen. Rename it.');
  if (name.endsWith('.')) throw refuse('ends in a dot, which not every disk can keep. Rename it.');
  if (!name.isWellFormed()) throw refuse('has broken characters in its name. Rename it.');
  if (name.length > MAX_CHARACTERS)
    throw refuse(`has ${name.length} characters in its name; ${MAX_CHARACTERS} are the most. Shorten it.`);
  return name;
};

/** What is wrong with a name is made visible in the sentence about it. */
const shown = (name: string): string => {
  const visible = Array.from(name.slice(0, 80)).map((sign) =>
    CONTROL.test(sign) || UNSEEN.test(sign) || !sign.isWellFormed()
      ? `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`
      : sign,
  );
  return visible.join('');
};
