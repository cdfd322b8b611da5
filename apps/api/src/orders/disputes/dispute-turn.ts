import type { DisputeState } from '../../adapters/payments/payments.js';
import type { DisputeStand } from './dispute.model.js';

const stands: Record<DisputeState, DisputeStand> = {
  'needs-response': 'open',
  'under-review': 'open',
  won: 'won',
  lost: 'lost',
  inquiry: 'inquiry',
  'inquiry-closed': 'closed',
};

/** Evidence handed in changes nothing for the shop: it waits for the end. */
export const standOf = (state: DisputeState): DisputeStand => stands[state];

export const isOver = (stand: DisputeStand): boolean => stand !== 'inquiry' && stand !== 'open';

/**
 * What is to be done where a dispute stands otherwise than the shop knew. Each stand says all that counts, so one
 * of which the shop hears at its end alone leads to the same as one that was followed from its beginning.
 * A loss is written into the books: what the service says of it afterwards is for people to look at.
 */
export const turnOf = (
  known: DisputeStand | null,
  told: DisputeStand,
): 'nothing' | 'rest' | 'go-on' | 'lose' | 'tell' | 'look' => {
  if (known === told) return 'nothing';
  if (known === 'lost') return 'look';
  if (told === 'open') return 'rest';
  if (told === 'lost') return 'lose';
  // An inquiry takes no money and rests no right.
  return told === 'inquiry' ? 'tell' : 'go-on';
};
