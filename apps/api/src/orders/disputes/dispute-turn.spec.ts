import type { DisputeStand } from './dispute.model.js';
import { isOver, standOf, turnOf } from './dispute-turn.js';

describe('a dispute that turns', () => {
  it('rests the rights when it opens, and an inquiry only tells', () => {
    expect(turnOf(null, 'open')).toBe('rest');
    expect(turnOf(null, 'inquiry')).toBe('tell');
    expect(turnOf('inquiry', 'open')).toBe('rest');
  });

  it('lets them go on when it is won or withdrawn, and ends them when it is lost', () => {
    expect(turnOf('open', 'won')).toBe('go-on');
    expect(turnOf('inquiry', 'closed')).toBe('go-on');
    expect(turnOf('open', 'lost')).toBe('lose');
  });

  it('comes to the same end where the shop hears of its end first', () => {
    expect(turnOf(null, 'won')).toBe('go-on');
    expect(turnOf(null, 'lost')).toBe('lose');
  });

  it('opens again where a dispute that was won is appealed, and only asks for a look after a loss', () => {
    expect(turnOf('won', 'open')).toBe('rest');
    expect(turnOf('lost', 'won')).toBe('look');
    expect(turnOf('lost', 'open')).toBe('look');
  });

  it('does nothing when it is told again', () => {
    for (const stand of ['inquiry', 'open', 'won', 'lost', 'closed'] satisfies DisputeStand[])
      expect(turnOf(stand, stand)).toBe('nothing');
  });

  it('stands the same while evidence is looked at', () => {
    expect(standOf('needs-response')).toBe('open');
    expect(standOf('under-review')).toBe('open');
    expect(isOver(standOf('under-review'))).toBe(false);
    expect(isOver(standOf('inquiry-closed'))).toBe(true);
  });
});
