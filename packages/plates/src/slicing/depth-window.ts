import type { Layer } from './layers.js';

/** Depth given to places above the part and below it. */
export const NOWHERE_MM = -1e6;

/**
 * For one layer, the least depth below the contour among the layers up to `reach` above and below it: how far
 * a place stays inside the part over that height.
 */
export class DepthWindow {
  private readonly byReach: Float32Array[];

  constructor(
    private readonly layers: readonly Layer[],
    cells: number,
    readonly reach: number,
  ) {
    this.byReach = Array.from({ length: reach + 1 }, () => new Float32Array(cells));
  }

  /** The same window one layer further up, if nothing in it differs. */
  isSameAsBelow(layer: number): boolean {
    for (let step = -this.reach - 1; step <= this.reach; step += 1) {
      if (this.layers[layer + step] !== this.layers[layer + step - 1]) return false;
    }
    return true;
  }

  moveTo(layer: number): void {
    this.byReach[0]!.set(this.layers[layer]!.depths);
    for (let reach = 1; reach <= this.reach; reach += 1) {
      const inner = this.byReach[reach - 1]!;
      const outer = this.byReach[reach]!;
      const above = this.layers[layer + reach];
      const below = this.layers[layer - reach];
      if (above === undefined || below === undefined) {
        outer.fill(NOWHERE_MM);
        continue;
      }
      const up = above.depths;
      const down = below.depths;
      for (let cell = 0; cell < outer.length; cell += 1) {
        const least = inner[cell]!;
        const a = up[cell]!;
        const b = down[cell]!;
        const other = a < b ? a : b;
        outer[cell] = other < least ? other : least;
      }
    }
  }

  within(reach: number): Float32Array {
    return this.byReach[reach]!;
  }
}
