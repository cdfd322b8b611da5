import type { Pledge } from '@windchest/contracts';
import { leadOf, restsWords, staysWords } from './pledge-words.js';

const pledge = (changes: Partial<Pledge> = {}): Pledge => ({
  id: '01900000-0000-7000-8000-000000000001',
  state: 'current',
  plan: { id: '01900000-0000-7000-8000-000000000002', name: 'High water' },
  amount: { minor: 900, currency: 'EUR' },
  keepsAfter: 'released-during',
  kits: [],
  nextPlan: null,
  beganAt: '2026-11-12T12:00:00.000Z',
  paidUntil: '2027-01-12T12:00:00.000Z',
  nextPaymentAt: '2027-01-12T12:00:00.000Z',
  endsAt: null,
  pausedUntil: null,
  resumesAt: null,
  graceUntil: null,
  settleUrl: null,
  paymentUrl: null,
  cardLast4: '4242',
  endedAt: null,
  deeds: [],
  pauses: [],
  ...changes,
});

describe('what the page of a pledge says', () => {
  it('names the next payment, with the amount of the plan chosen for it', () => {
    expect(leadOf(pledge())).toBe('Paid until 12 Jan 2027. Then the next €9.00 are taken.');
    const nextPlan = {
      id: '01900000-0000-7000-8000-000000000003',
      name: 'Spring tide',
      amount: { minor: 1500, currency: 'EUR' },
      from: '2027-01-12T12:00:00.000Z',
    };
    expect(leadOf(pledge({ nextPlan }))).toContain('€15.00');
  });

  it('names the end, the pause and the grace by their days', () => {
    expect(leadOf(pledge({ endsAt: '2027-01-12T12:00:00.000Z' }))).toMatch(/^It ends on 12 Jan 2027/);
    expect(leadOf(pledge({ pausedUntil: '2027-03-12T12:00:00.000Z' }))).toMatch(/rests until 12 Mar 2027/);
    expect(leadOf(pledge({ state: 'grace', graceUntil: '2027-01-19T12:00:00.000Z' }))).toMatch(
      /€9.00 did not go through.*until 19 Jan 2027/,
    );
    expect(leadOf(pledge({ state: 'paused', nextPaymentAt: null }))).toBe(
      'Nothing is charged while it rests.',
    );
  });

  it('says what stays on the shelf, by the plan', () => {
    expect(staysWords(pledge())).toContain('released since 12 Nov 2026 stays');
    expect(staysWords(pledge({ keepsAfter: 'nothing' }))).toMatch(/^The plan’s kits leave your shelf/);
    expect(restsWords(pledge({ keepsAfter: 'released-before-end' }))).toMatch(/no new revisions/);
  });
});
