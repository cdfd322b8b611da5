export type Succeeds = { kind: 'succeeds' };
export type Declined = { kind: 'declined'; code: string; declineCode: string | null; message: string };
/** The bank asks the buyer first; `afterwards` is what happens once it is approved. */
export type SecondStep = { kind: 'second-step'; afterwards: Succeeds | Declined };
/** What a test card does when it is charged. */
export type CardBehaviour = Succeeds | Declined | SecondStep;

export type CardTraits = {
  /** While the buyer is at the page. */
  behaviour: CardBehaviour;
  /** When it is given for later, and nothing is charged. */
  saving: CardBehaviour;
  /** When it is charged later and nobody is there to answer the bank. */
  later: CardBehaviour;
  /** `late`: refunds are pending for a while; `bounce`: the bank sends them back. */
  refunds: 'at-once' | 'late' | 'bounce';
  /** The dispute that a payment with it brings, at once. */
  dispute: { reason: string; isInquiry: boolean } | null;
};

export const succeeds: Succeeds = { kind: 'succeeds' };
const declined = (code: string, declineCode: string | null, message: string): Declined => ({
  kind: 'declined',
  code,
  declineCode,
  message,
});
export const genericDecline = declined('card_declined', 'generic_decline', 'Your card was declined.');
export const insufficientFunds = declined(
  'card_declined',
  'insufficient_funds',
  'Your card has insufficient funds.',
);
export const expiredCard = declined('expired_card', null, 'Your card has expired.');
export const authenticationRequired = declined(
  'authentication_required',
  'authentication_required',
  'Your card was declined. This transaction requires authentication.',
);
export const secondStep: SecondStep = { kind: 'second-step', afterwards: succeeds };

type Given = Partial<CardTraits>;

// Numbers and outcomes as in the service's public page on testing; written from memory of that page.
const documented: Record<string, Given> = {
  '4000000000000002': { behaviour: genericDecline },
  '4000000000009995': { behaviour: insufficientFunds },
  '4000000000009987': { behaviour: declined('card_declined', 'lost_card', 'Your card was declined.') },
  '4000000000000069': { behaviour: expiredCard },
  '4000000000000127': {
    behaviour: declined('incorrect_cvc', null, "Your card's security code is incorrect."),
  },
  '4000000000000119': {
    behaviour: declined('processing_error', null, 'An error occurred while processing your card.'),
  },
  // Can be given for later, but every charge fails.
  '4000000000000341': { behaviour: genericDecline, saving: succeeds },
  // Authenticated once, it can be charged later.
  '4000002500003155': { behaviour: secondStep },
  // Wants to be authenticated each time.
  '4000002760003184': { behaviour: secondStep, later: authenticationRequired },
  '4000000000003220': { behaviour: secondStep, later: authenticationRequired },
  '4000008260003178': {
    behaviour: { kind: 'second-step', afterwards: insufficientFunds },
    saving: secondStep,
  },
  '4000000000007726': { refunds: 'late' },
  '4000000000005126': { refunds: 'bounce' },
  '4000000000000259': { dispute: { reason: 'fraudulent', isInquiry: false } },
  '4000000000002685': { dispute: { reason: 'product_not_received', isInquiry: false } },
  '4000000000001976': { dispute: { reason: 'fraudulent', isInquiry: true } },
};

// The stand-in's own: the buyer pays, and what is taken later fails.
const own: Record<string, Given> = {
  '4000000000099210': { later: genericDecline },
  '4000000000099319': { later: insufficientFunds },
  '4000000000099418': { later: expiredCard },
};

export function cardTraits(number: string): CardTraits {
  const given = documented[number] ?? own[number] ?? {};
  const behaviour = given.behaviour ?? succeeds;
  return {
    behaviour,
    saving: given.saving ?? behaviour,
    later: given.later ?? (behaviour.kind === 'second-step' ? behaviour.afterwards : behaviour),
    refunds: given.refunds ?? 'at-once',
    dispute: given.dispute ?? null,
  };
}
