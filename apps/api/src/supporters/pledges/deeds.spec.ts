import { deedsOf } from './deeds.js';

const facts = { state: 'current', endsAt: null, endWish: null, pauseWish: null, nextPlanId: null } as const;

describe('what a supporter can do with a pledge', () => {
  it('is to change, pause and end one that goes on', () => {
    expect(deedsOf(facts)).toEqual(['change-plan', 'pause', 'end', 'card']);
    expect(deedsOf({ ...facts, nextPlanId: 'x' })).toContain('keep-plan');
    expect(deedsOf({ ...facts, pauseWish: 'pause' })).toEqual(['change-plan', 'resume', 'end', 'card']);
  });

  it('is to take an end back, from the moment it was asked for', () => {
    expect(deedsOf({ ...facts, endWish: 'end' })).toEqual(['keep', 'card']);
    expect(deedsOf({ ...facts, endsAt: new Date() })).toEqual(['keep', 'card']);
    expect(deedsOf({ ...facts, endsAt: new Date(), endWish: 'keep' })).toContain('end');
  });

  it('is to give up one that was not begun, and nothing with one that is over', () => {
    expect(deedsOf({ ...facts, state: 'opening' })).toEqual(['give-up']);
    expect(deedsOf({ ...facts, state: 'lapsed' })).toEqual([]);
    expect(deedsOf({ ...facts, state: 'ended' })).toEqual([]);
  });

  it('is to end, or give another card, while a payment is open', () => {
    expect(deedsOf({ ...facts, state: 'grace' })).toEqual(['end', 'card']);
  });

  it('is to take up one that rests', () => {
    expect(deedsOf({ ...facts, state: 'paused', pauseWish: 'pause' })).toEqual(['resume', 'end', 'card']);
    expect(deedsOf({ ...facts, state: 'paused', pauseWish: 'resume' })).toEqual(['end', 'card']);
  });
});
