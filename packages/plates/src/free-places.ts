import { boxOf, type Box } from './convex-hull.js';
import { borderCrossings, boxesMeet, depthInside } from './convex-sum.js';
import type { Point } from './types.js';

/** Taken out of the loops: some hosts look globals up slowly. */
const { max, min } = Math;

interface Obstacle {
  readonly polygon: readonly Point[];
  readonly box: Box;
}

const TOUCHES_MM = 1e-7;

/**
 * Places in a rectangle that lie outside convex obstacles and may be nearest to an edge: the rectangle's
 * corners, the obstacles' corners, and the crossings of all their borders. Kept up to date as obstacles come,
 * since a place once covered stays covered.
 */
export class FreePlaces {
  private readonly known: Obstacle[] = [];
  private places: Point[];

  constructor(
    private readonly widthMm: number,
    private readonly depthMm: number,
  ) {
    this.places = [
      [0, 0],
      [widthMm, 0],
      [widthMm, depthMm],
      [0, depthMm],
    ];
  }

  get obstacles(): number {
    return this.known.length;
  }

  first(compare: (a: Point, b: Point) => number): Point | undefined {
    let first: Point | undefined;
    for (const place of this.places) if (first === undefined || compare(place, first) < 0) first = place;
    return first;
  }

  add(polygon: readonly Point[]): void {
    const obstacle = { polygon, box: boxOf(polygon) };
    this.places = this.places.filter((place) => !covers(obstacle, place));
    const fresh: Point[] = [...polygon, ...this.edgeCrossings(obstacle)];
    for (const other of this.known) {
      if (boxesMeet(obstacle.box, other.box)) fresh.push(...borderCrossings(polygon, other.polygon));
    }
    this.known.push(obstacle);
    for (const place of fresh) {
      if (this.isInside(place) && !this.known.some((each) => covers(each, place))) {
        this.places.push([min(this.widthMm, max(0, place[0])), min(this.depthMm, max(0, place[1]))]);
      }
    }
  }

  private isInside([x, y]: Point): boolean {
    return (
      x >= -TOUCHES_MM && x <= this.widthMm + TOUCHES_MM && y >= -TOUCHES_MM && y <= this.depthMm + TOUCHES_MM
    );
  }

  /** Where an obstacle's border crosses the edge of the rectangle. */
  private edgeCrossings({ polygon }: Obstacle): Point[] {
    const crossings: Point[] = [];
    let a = polygon.at(-1)!;
    for (const b of polygon) {
      for (const x of [0, this.widthMm]) {
        if ((a[0] - x) * (b[0] - x) > 0 || a[0] === b[0]) continue;
        crossings.push([x, a[1] + ((x - a[0]) / (b[0] - a[0])) * (b[1] - a[1])]);
      }
      for (const y of [0, this.depthMm]) {
        if ((a[1] - y) * (b[1] - y) > 0 || a[1] === b[1]) continue;
        crossings.push([a[0] + ((y - a[1]) / (b[1] - a[1])) * (b[0] - a[0]), y]);
      }
      a = b;
    }
    return crossings;
  }
}

function covers({ polygon, box }: Obstacle, [x, y]: Point): boolean {
  if (x <= box.left || x >= box.right || y <= box.front || y >= box.back) return false;
  return depthInside(polygon, x, y) > TOUCHES_MM;
}
