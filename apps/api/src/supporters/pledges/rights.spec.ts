import { BEGIN, after } from '../../testing/pledge-views.js';
import { rightsOf } from './rights.js';

const pledge = { beganAt: BEGIN, keepsAfter: 'released-during' } as const;

describe('what a pledge gives a right to', () => {
  it('is the whole while it is paid, and through the grace days', () => {
    for (const state of ['current', 'grace'] as const)
      expect(rightsOf({ ...pledge, state }, false, after(1))).toMatchObject({
        isWhole: true,
        isResting: false,
      });
  });

  it('is what was released in its time once it rests or is over', () => {
    const kept = { releasedFrom: BEGIN, releasedBefore: after(4) };
    expect(rightsOf({ ...pledge, state: 'paused' }, false, after(4))).toEqual({
      isWhole: false,
      isResting: true,
      kept,
    });
    for (const state of ['lapsed', 'ended'] as const)
      expect(rightsOf({ ...pledge, state }, false, after(4))).toEqual({
        isWhole: false,
        isResting: false,
        kept,
      });
  });

  it('is by the plan also all that was released before, or nothing', () => {
    const over = { ...pledge, state: 'ended' } as const;
    expect(rightsOf({ ...over, keepsAfter: 'released-before-end' }, false, after(4)).kept).toEqual({
      releasedFrom: null,
      releasedBefore: after(4),
    });
    expect(rightsOf({ ...over, keepsAfter: 'nothing' }, false, after(4)).kept).toBeNull();
  });

  it('rests while the bank may take the last payment back', () => {
    expect(rightsOf({ ...pledge, state: 'current' }, true, after(1))).toEqual({
      isWhole: false,
      isResting: true,
      kept: null,
    });
  });
});
