import { largestScale, scaleText } from './drawing-scale.js';
import { mm } from '../../typesetting/page-geometry.js';
import { labelHeight, layOutPartsSheet, type DrawnPart } from './parts-sheet-layout.js';

const drawn = (code: string, widthMm: number, heightMm: number): DrawnPart => ({
  code,
  name: code,
  quantity: 1,
  isGauge: false,
  clearances: [],
  orientation: 'may-turn',
  sizeMm: null,
  volumeCm3: null,
  printSpec: null,
  drawing: { path: '', edges: '', viewBox: `0 0 ${widthMm} ${heightMm}`, widthMm, heightMm },
});
const many = (count: number, widthMm: number, heightMm: number) =>
  Array.from({ length: count }, (_, at) => drawn(`P-${at}`, widthMm, heightMm));
const room = { width: mm(150), height: mm(220) };
const layOut = (parts: readonly DrawnPart[]) => layOutPartsSheet(parts, room, () => 20);

describe('layOutPartsSheet', () => {
  it('draws all parts to one scale, the largest at which they fit one page', () => {
    const { ratio, pages } = layOut([drawn('A-1', 100, 50), drawn('A-2', 20, 10)]);
    expect(ratio).toBe(1);
    expect(pages).toHaveLength(1);
    expect(pages[0]?.map(({ width }) => width)).toEqual([mm(100), mm(20)]);
  });

  it('takes more pages rather than draw smaller than a quarter', () => {
    const { ratio, pages } = layOut(many(60, 200, 200));
    expect(ratio).toBeGreaterThanOrEqual(1 / 4);
    expect(pages.length).toBeGreaterThan(1);
    expect(pages.flat()).toHaveLength(60);
  });

  it('draws smaller than a quarter what would not fit a page otherwise', () => {
    const { ratio, pages } = layOut([drawn('A-1', 1400, 30)]);
    expect(ratio).toBe(1 / 10);
    expect(pages).toHaveLength(1);
  });

  it('keeps parts and their lettering within the page, in rows that do not overlap', () => {
    for (const page of layOut([...many(30, 14, 160), ...many(10, 105, 39)]).pages) {
      const sorted = page.toSorted((a, b) => a.y + a.height - b.y - b.height || a.cellX - b.cellX);
      for (const { x, y, width, height } of page) {
        expect(x).toBeGreaterThanOrEqual(0);
        expect(y).toBeGreaterThanOrEqual(-1e-9);
        expect(x + width).toBeLessThanOrEqual(room.width + 1e-9);
        expect(y + height + labelHeight).toBeLessThanOrEqual(room.height + 1e-9);
      }
      sorted.slice(1).forEach((one, at) => {
        const before = sorted[at];
        if (before && Math.abs(before.y + before.height - one.y - one.height) < 1e-6)
          expect(one.cellX).toBeGreaterThan(before.cellX + before.cellWidth);
      });
    }
  });

  it('has no pages for no parts', () => {
    expect(layOut([]).pages).toEqual([]);
  });
});

describe('scales', () => {
  it('are written as ISO 5455 writes them', () => {
    expect([5, 1, 1 / 1.5, 1 / 2, 1 / 10].map(scaleText)).toEqual([
      '5 : 1',
      '1 : 1',
      '1 : 1.5',
      '1 : 2',
      '1 : 10',
    ]);
  });

  it('are the largest that fit, and the smallest there is where none does', () => {
    expect(largestScale((ratio) => ratio * 160 <= 100)).toBe(1 / 2);
    expect(largestScale(() => true, 1)).toBe(1);
    expect(largestScale(() => false)).toBe(1 / 50);
  });
});
