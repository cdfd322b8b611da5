import { layOutBars } from './bars-layout.js';

const room = { widthPx: 300, heightPx: 100 };

describe('bars', () => {
  it('are as tall as there is room at most, the others in proportion', () => {
    const { bars, tallest } = layOutBars([[2000], [1000], [0]], room);
    expect(bars.map((bar) => bar.parts[0]?.height)).toEqual([100, 50, 0]);
    expect(tallest).toBe(0);
    expect(bars.map((bar) => bar.x)).toEqual([0, 100, 200]);
    expect(bars[0]).toMatchObject({ width: 40, barX: 30 });
  });

  it('stack their parts from the foot upwards', () => {
    const { bars } = layOutBars([[1, 2, 1]], { widthPx: 100, heightPx: 80 });
    expect(bars[0]?.parts).toEqual([
      { y: 60, height: 20 },
      { y: 20, height: 40 },
      { y: 0, height: 20 },
    ]);
  });

  it('show a small one beside a great one', () => {
    const { bars } = layOutBars([[1_000_000], [100]], room);
    expect(bars[1]?.parts).toEqual([{ y: 98, height: 2 }]);
  });

  it('have no tallest one where there is nothing', () => {
    expect(layOutBars([[0]], room).tallest).toBeUndefined();
    expect(layOutBars([], room).bars).toEqual([]);
  });
});
