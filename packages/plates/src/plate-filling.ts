import { moved } from './convex-hull.js';
import { convexSum, negated } from './convex-sum.js';
import { FreePlaces } from './free-places.js';
import type { Point } from './types.js';

/** One way to put a piece on the plate: its outline with the box's left front corner at the origin. */
export interface Pose {
  readonly turnedDegrees: number;
  readonly laidAxis?: 'x' | 'y';
  readonly outline: readonly Point[];
  /** The outline as packed (few corners, around the true one), and the same grown by the gap. */
  readonly hull: readonly Point[];
  readonly grownHull: readonly Point[];
  readonly widthMm: number;
  readonly depthMm: number;
}

export interface Spot {
  readonly pose: Pose;
  readonly xMm: number;
  readonly yMm: number;
}

/** Which way a plate fills up: from the front edge backwards, or from the left edge rightwards. */
export type FillOrder = 'front-first' | 'left-first';

const TOUCHES_MM = 1e-7;

/**
 * One plate being filled. A piece goes to the free place nearest the edge that fills first. Free places for a
 * pose are outside the sums of each placed outline with the mirrored pose (no-fit polygons, exact for convex
 * outlines); the nearest one is at a corner or a crossing of their borders.
 */
export class PlateFilling {
  readonly spots: Spot[] = [];
  private readonly freePlaces = new Map<Pose, FreePlaces>();
  private readonly sums = new Map<Pose, Map<Pose, readonly Point[]>>();

  constructor(
    private readonly widthMm: number,
    private readonly depthMm: number,
    private readonly order: FillOrder,
  ) {}

  /** Places a piece in one of its poses, or returns false where none has room left. */
  place(poses: readonly Pose[]): boolean {
    let best: Spot | undefined;
    for (const pose of poses) {
      const spot = this.nearestFree(pose);
      if (spot !== undefined && (best === undefined || this.isNearer(spot, best))) best = spot;
    }
    if (best === undefined) return false;
    this.spots.push(best);
    return true;
  }

  /** How far the plate is filled along its filling direction, in mm. */
  get filledMm(): number {
    return Math.max(0, ...this.spots.map((spot) => this.reach(spot)));
  }

  private nearestFree(pose: Pose): Spot | undefined {
    let free = this.freePlaces.get(pose);
    if (free === undefined) {
      const widthMm = this.widthMm - pose.widthMm;
      const depthMm = this.depthMm - pose.depthMm;
      if (widthMm < -TOUCHES_MM || depthMm < -TOUCHES_MM) return undefined;
      free = new FreePlaces(Math.max(0, widthMm), Math.max(0, depthMm));
      this.freePlaces.set(pose, free);
    }
    // Places taken since this pose was last asked for.
    while (free.obstacles < this.spots.length) free.add(this.obstacle(this.spots[free.obstacles]!, pose));
    const first = free.first((p, q) => this.compare(p, q));
    return first === undefined ? undefined : { pose, xMm: first[0], yMm: first[1] };
  }

  private obstacle(spot: Spot, pose: Pose): readonly Point[] {
    let known = this.sums.get(spot.pose);
    if (known === undefined) this.sums.set(spot.pose, (known = new Map()));
    let sum = known.get(pose);
    if (sum === undefined) known.set(pose, (sum = convexSum(spot.pose.grownHull, negated(pose.hull))));
    return moved(sum, spot.xMm, spot.yMm);
  }

  private compare(a: Point, b: Point): number {
    return this.order === 'front-first' ? a[1] - b[1] || a[0] - b[0] : a[0] - b[0] || a[1] - b[1];
  }

  private isNearer(a: Spot, b: Spot): boolean {
    const difference = this.reach(a) - this.reach(b);
    if (Math.abs(difference) > TOUCHES_MM) return difference < 0;
    return this.compare([a.xMm, a.yMm], [b.xMm, b.yMm]) < 0;
  }

  private reach({ pose, xMm, yMm }: Spot): number {
    return this.order === 'front-first' ? yMm + pose.depthMm : xMm + pose.widthMm;
  }
}
