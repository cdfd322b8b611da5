import type { Placement } from '@windchest/plates';
import { labelPlace, pathOf } from './plate-paths.js';

const bed = { xMm: 200, yMm: 100, zMm: 100 };
const rectangle = (x: number, y: number, width: number, depth: number): Placement => ({
  code: 'A-01',
  xMm: x,
  yMm: y,
  turnedDegrees: 0,
  polygon: [
    [x, y],
    [x + width, y],
    [x + width, y + depth],
    [x, y + depth],
  ],
});
const label = { widthMm: 20, heightMm: 6, slackMm: 0 };

describe('pieces on a drawn plate', () => {
  it('stand with the front edge of the bed at the foot', () => {
    expect(pathOf(rectangle(10, 0, 30, 20), bed)).toBe('M10 100L40 100L40 80L10 80Z');
  });

  it('bear their code in the middle, lying where there is room, else upright, else not', () => {
    expect(labelPlace(rectangle(10, 20, 30, 20), bed, label)).toEqual({ xMm: 25, yMm: 70, isUpright: false });
    expect(labelPlace(rectangle(10, 20, 8, 40), bed, label)?.isUpright).toBe(true);
    expect(labelPlace(rectangle(10, 20, 8, 8), bed, label)).toBeNull();
    expect(labelPlace(rectangle(10, 20, 8, 8), bed, { ...label, slackMm: 6 })?.isUpright).toBe(false);
  });

  it('have their middle where their area is, not where their box is', () => {
    const triangle: Placement = {
      ...rectangle(0, 0, 1, 1),
      polygon: [
        [0, 0],
        [90, 0],
        [0, 60],
      ],
    };
    expect(labelPlace(triangle, bed, { widthMm: 1, heightMm: 1, slackMm: 0 })).toMatchObject({
      xMm: 30,
      yMm: 80,
    });
  });
});
