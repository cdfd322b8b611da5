import {
  boxAround,
  cornersInViews,
  layOutThreeViews,
  placeInViews,
  viewNames,
} from './three-views-layout.js';

const box = { min: { x: -10, y: 0, z: 0 }, max: { x: 30, y: 20, z: 80 } };

describe('the three views of a part', () => {
  it('stand above and beside each other to one scale, within the room there is', () => {
    const { pxPerMm, widthPx, heightPx, views } = layOutThreeViews(box, { widthPx: 328, maxHeightPx: 320 });
    expect(widthPx).toBeLessThanOrEqual(328);
    expect(heightPx).toBeLessThanOrEqual(320);
    expect(views.front.widthPx).toBeCloseTo(40 * pxPerMm, 9);
    expect(views.side.widthPx).toBeCloseTo(20 * pxPerMm, 9);
    expect(views.top.heightPx).toBeCloseTo(20 * pxPerMm, 9);
    expect(views.top.x).toBe(views.front.x);
    expect(views.side.y).toBe(views.front.y);
    expect(views.side.x).toBeGreaterThan(views.front.x + views.front.widthPx);
    for (const name of viewNames) {
      const { x, y, widthPx: w, heightPx: h } = views[name];
      expect(x + w).toBeLessThan(widthPx);
      expect(y + h).toBeLessThan(heightPx);
    }
  });

  it('do not make a small part look large', () => {
    const nut = { min: { x: 0, y: 0, z: 0 }, max: { x: 4, y: 4, z: 3 } };
    expect(layOutThreeViews(nut, { widthPx: 800, maxHeightPx: 800 }).pxPerMm).toBe(6);
  });

  it('show a place of the file from above, from the front and from the right', () => {
    // A quarter from the left, at the front, near the top.
    expect(placeInViews({ x: 0, y: 0, z: 75 }, box)).toEqual({
      top: { x: 10, y: 20 },
      front: { x: 10, y: 5 },
      side: { x: 0, y: 5 },
    });
  });

  it('make room for what was there before', () => {
    const earlier = { min: { x: -12, y: 2, z: 0 }, max: { x: 30, y: 20, z: 81.5 } };
    expect(boxAround(box, earlier)).toEqual({
      min: { x: -12, y: 0, z: 0 },
      max: { x: 30, y: 20, z: 81.5 },
    });
    // The present part begins 2 mm from the left and 1.5 mm below the earlier one's top.
    expect(cornersInViews(box, boxAround(box, earlier))).toEqual({
      top: { x: 2, y: 0 },
      front: { x: 2, y: 1.5 },
      side: { x: 0, y: 1.5 },
    });
  });
});
