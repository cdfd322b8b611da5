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
  { role: 'buyer', email: 'enno.rask@mail.example', passphrase: 'a flute for every tide' },
  { role: 'buyer', email: 'sorrel.vane@mail.example', passphrase: 'two kits and the kettle' },
  { role: 'buyer', email: 'bryony.tarn@mail.example', passphrase: 'until the winter is over' },
  { role: 'buyer', email: 'rhea.moss@mail.example', passphrase: 'still waiting for the post' },
];
