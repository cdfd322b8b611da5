import type { DemoRole } from './demo-types.js';

export interface DemoSignIn {
  role: DemoRole;
  email: string;
  passphrase: string;
}

/** Accounts of the demo workshop. They are for looking round a shop on one's own machine, never for a real one. */
export const demoSignIns: readonly DemoSignIn[] = [
  { role: 'owner', email: 'merrin@saltmarsh.example', passphrase: 'samphire at low water' },
  { role: 'maker', email: 'tamsin@saltmarsh.example', passphrase: 'eleven millimetre bores' },
  { role: 'helper', email: 'odo@saltmarsh.example', passphrase: 'answers before noon tide' },
  { role: 'bookkeeper', email: 'ines@saltmarsh.example', passphrase: 'every cent finds its line' },
  { role: 'buyer', email: 'pia.lund@mail.example', passphrase: 'eighteen pipes on a sill' },
  { role: 'buyer', email: 'jonas.abara@mail.example', passphrase: 'chime bars by the window' },
  { role: 'buyer', email: 'rhea.moss@mail.example', passphrase: 'still waiting for the post' },
];
