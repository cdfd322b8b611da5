import { barsOf } from './sales-bars.js';

const day = (name: string, minor: number) => ({
  day: name,
  orders: minor > 0 ? 1 : 0,
  gross: { minor, currency: 'EUR' },
});
const room = { widthPx: 300, heightPx: 100 };

describe('barsOf', () => {
  it('draws the best day as tall as there is room and the others in proportion', () => {
    const { bars, most } = barsOf([day('a', 2000), day('b', 1000), day('c', 0)], room);
    expect(bars.map((bar) => bar.height)).toEqual([100, 50, 0]);
    expect(most?.day).toBe('a');
    expect(bars.map((bar) => bar.x)).toEqual([0, 100, 200]);
  });

  it('shows a small day beside a great one', () => {
    const { bars } = barsOf([day('a', 1_000_000), day('b', 100)], room);
    expect(bars[1]?.height).toBe(2);
  });

  it('has no best day where nothing was sold', () => {
    expect(barsOf([day('a', 0)], room).most).toBeUndefined();
    expect(barsOf([], room).bars).toEqual([]);
  });
});
