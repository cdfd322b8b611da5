import type { Gate } from '@windchest/contracts';
import type { GateWaiver } from './gate-waiver.model.js';

type Waiver = Pick<GateWaiver, 'reason' | 'waivedAgainst' | 'waivedByName' | 'waivedAt'>;

/**
 * A gate together with its waiver. It is waived while it says what was waived: another leak in another part
 * opens it again. What a revision was released with stays as it was, whatever the checks say later.
 */
export const applyWaiver = (gate: Gate, waiver: Waiver | undefined, isReleased: boolean): Gate => {
  if (!waiver) return gate;
  const { reason, waivedAgainst, waivedByName, waivedAt } = waiver;
  const counts = gate.state === 'open' && gate.mayBeWaived && (isReleased || gate.reason === waivedAgainst);
  return {
    ...gate,
    state: counts ? 'waived' : gate.state,
    waiver: { by: waivedByName, at: waivedAt.toISOString(), reason, against: waivedAgainst },
  };
};
