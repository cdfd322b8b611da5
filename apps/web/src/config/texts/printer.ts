import type { Clearance } from '@windchest/contracts';

/** A printer card: written down, chosen, kept. */
export const printerTexts = {
  title: 'My printer',
  change: (name: string) => `Change ${name}`,
  whyBrowser:
    'The shop then says of every kit whether it fits, on how many plates, and how long it prints. The card stays in this browser.',
  whyAccount:
    'The shop then says of every kit whether it fits, on how many plates, and how long it prints. The card is kept on your account.',
  name: 'Name',
  firstName: 'My printer',
  x: 'Width',
  y: 'Depth',
  z: 'Height',
  nozzle: 'Nozzle',
  filaments: 'Filaments',
  filamentsHint: (known: string) =>
    `The weight of ${known} is known here. Any other word is kept too, but without grams and cost. Prices may be left empty.`,
  filament: 'Filament',
  filamentOf: (at: number) => `Filament ${at}`,
  pricePerKg: (currency: string) => `Price per kg, ${currency}`,
  addFilament: 'Add a filament',
  removeFilament: 'Remove',
  removeFilamentOf: (at: number) => `Remove filament ${at}`,
  clearance: 'Clearance',
  clearanceHint:
    'Which of the three a gauge part told you to print. Leave it open until you have printed one.',
  clearanceOpen: 'not known yet',
  clearances: {
    minus: '− closer than drawn',
    zero: '0 as drawn',
    plus: '+ looser than drawn',
  } satisfies Record<Clearance, string>,
  isMain: 'This is my main printer',
  keep: 'Keep this printer',
  keeping: 'Keeping …',
  forget: 'Forget it',
  cancel: 'Leave it',
  failed: 'The printer was not kept',

  choose: 'Printer',
  inBrowser: 'in this browser',
  option: (name: string, bed: string) => `${name}, ${bed}`,
  nozzleOf: (length: string) => `${length} nozzle`,
  perKg: (material: string, price: string) => `${material} at ${price} a kg`,
  clearanceOf: (which: string) => `clearance ${which}`,
  writeAnother: 'Write down another',

  offerTitle: 'One printer is written down in this browser only',
  offer: 'On your account it is at hand wherever you sign in.',
  offerKeep: 'Keep it on my account',
  offerFailed: 'The printer was not kept on your account',
};

/** The account page's part. */
export const ownPrintersTexts = {
  heading: 'Printers',
  failed: 'Your printers cannot be listed',
  none: 'No printer yet',
  noneDetail:
    'With a printer written down, every kit says whether it fits, on how many plates, and how long it prints.',
  add: 'Write down a printer',
  full: (most: number) => `An account keeps ${most} printers. Throw one away to write down another.`,
  main: 'main printer',
  change: 'Change',
  changeOf: (name: string) => `Change ${name}`,
  makeMain: 'Make it the main one',
  makeMainOf: (name: string) => `Make ${name} the main one`,
  mainFailed: 'The main printer is the same as before',
  remove: 'Throw away',
  removeOf: (name: string) => `Throw ${name} away`,
  removeTitle: (name: string) => `Throw ${name} away?`,
  removeDetail: 'Its card is gone then, prices and clearance too. Nothing you bought or printed changes.',
  removeMainDetail: (next: string) => `${next} becomes the main printer.`,
  removeFailed: 'The printer is still there',
};
