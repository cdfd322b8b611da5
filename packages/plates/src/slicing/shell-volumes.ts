import type { ShellProfile, WallProfile } from '../types.js';
import { DepthWindow, NOWHERE_MM } from './depth-window.js';
import type { SlicedMesh } from './layers.js';
import { markSmallRegions } from './small-regions.js';

/**
 * Line spacing and overlap that the widths below are made from: a 0.4 mm nozzle in 0.2 mm layers. Infill
 * reaches this far into the walls.
 */
const LINE_MM = 0.407;
const OVERLAP_MM = 0.25 * LINE_MM;
/** Solid strips under a slope are printed from one line up, and then a little wider. */
const STRIP_GROWTH_MM = 0.3 * LINE_MM;
/** Visible top and bottom surfaces that show inside the walls are anchored this far around (slicers' usual). */
const SURFACE_MARGIN_MM = 3;
/** Solid layers over infill are bridged from three threads of the nozzle's width to each side. */
const BRIDGE_WIDTH_MM = 2.4;
/** The layer thickness that slopes are judged by, when thicker layers were cut. */
const USUAL_LAYER_MM = 0.2;
/** Borders are measured as the area lost over this inset. */
const BORDER_STEP_MM = 0.25;

/** Taken out of the loops: some hosts look globals up slowly. */
const { min } = Math;

type Mutable<T> = { -readonly [K in keyof T]: T[K] };
type Sums = Mutable<ShellProfile>;

/**
 * Splits what lies inside walls of each thickness into solid shells and room for infill.
 *
 * A place is solid when the part, less its walls, ends within the shell's layers above or below it; so slopes
 * get solid strips behind their walls, as slicers that keep the shell's thickness print them.
 *
 * @param wallMmSteps thicknesses of wall.
 * @param shellLayers numbers of solid layers at top and bottom, rising, in layers of the sliced mesh.
 */
export function wallProfiles(
  sliced: SlicedMesh,
  wallMmSteps: readonly number[],
  shellLayers: readonly number[],
): WallProfile[] {
  const { grid, plan, layers } = sliced;
  const cells = grid.columns * grid.rows;
  const reach = shellLayers.at(-1)!;
  const walls = wallMmSteps.map((wallMm) => new WallSums(wallMm - OVERLAP_MM, shellLayers, sliced));
  let window = new DepthWindow(layers, cells, reach);
  let previous = new DepthWindow(layers, cells, reach);
  for (let layer = 0; layer < layers.length; layer += 1) {
    if (layer > 0 && window.isSameAsBelow(layer)) {
      for (const wall of walls) wall.repeat();
      continue;
    }
    // After repeats the window below is still right: nothing in it differed.
    [window, previous] = [previous, window];
    window.moveTo(layer);
    for (const wall of walls) wall.add(layer, window, layer > 0 ? previous : undefined);
  }
  return walls.map((wall) => wall.total(plan.layerMm));
}

/** Sums over all layers for one thickness of wall; areas, until `total` gives them a height. */
class WallSums {
  private fill = 0;
  private ceiling = 0;
  private lastFill = 0;
  private readonly shells: Sums[];
  private readonly lastShells: Sums[];
  /** For each shell, what each cell of the layer below was: 0 solid or empty, 1 infill, 2 small region. */
  private readonly kinds: Uint8Array[];
  private readonly kindsBelow: Uint8Array[];
  private readonly cover: Float32Array;
  /** The cells inside the walls of the layer at hand, wholly or in part: `insideCount` of them. */
  private readonly insideCells: Int32Array;
  private insideCount = 0;

  constructor(
    private readonly insetMm: number,
    private readonly shellLayers: readonly number[],
    private readonly sliced: SlicedMesh,
  ) {
    const cells = sliced.grid.columns * sliced.grid.rows;
    this.shells = shellLayers.map(emptySums);
    this.lastShells = shellLayers.map(emptySums);
    this.kinds = shellLayers.map(() => new Uint8Array(cells));
    this.kindsBelow = shellLayers.map(() => new Uint8Array(cells));
    this.cover = new Float32Array(cells);
    this.insideCells = new Int32Array(cells);
  }

  repeat(): void {
    this.fill += this.lastFill;
    this.shells.forEach((sums, i) => {
      const last = this.lastShells[i]!;
      sums.sparseMm3 += last.sparseMm3;
      sums.smallMm3 += last.smallMm3;
      sums.sparseSideMm2 += last.sparseSideMm2;
    });
  }

  add(layer: number, window: DepthWindow, previous: DepthWindow | undefined): void {
    const { grid, layers } = this.sliced;
    const own = layers[layer]!.depths;
    const up = layers[layer + 1]?.depths;
    const down = layers[layer - 1]?.depths;
    const isSmall = this.findSmall(own, up, down);
    this.shellLayers.forEach((count, i) => {
      const now = emptySums();
      this.addShell(now, i, count, { own, up, down, isSmall, window, previous });
      const area = grid.cellMm ** 2;
      const sums = this.shells[i]!;
      for (const key of Object.keys(now) as (keyof ShellProfile)[]) {
        now[key] *= area;
        sums[key] += now[key];
      }
      this.lastShells[i] = now;
    });
  }

  /** Small regions are those of the layer inside its walls, less what shows from above or below. */
  private findSmall(own: Float32Array, up?: Float32Array, down?: Float32Array): Uint8Array {
    const { cellMm, columns } = this.sliced.grid;
    let fill = 0;
    let ceiling = 0;
    this.insideCount = 0;
    this.cover.fill(0);
    for (let cell = 0; cell < own.length; cell += 1) {
      const inner = own[cell]! - this.insetMm;
      if (inner <= -cellMm / 2) continue;
      this.insideCells[this.insideCount] = cell;
      this.insideCount += 1;
      const covered = coverOf(inner, cellMm);
      fill += covered;
      const above = up === undefined ? NOWHERE_MM : up[cell]!;
      const below = down === undefined ? NOWHERE_MM : down[cell]!;
      if (down !== undefined && below < 0) ceiling += coverOf(min(inner, -below), cellMm);
      this.cover[cell] = coverOf(min(inner, above, below), cellMm);
    }
    this.lastFill = fill * cellMm ** 2;
    this.fill += this.lastFill;
    this.ceiling += ceiling * cellMm ** 2;
    return markSmallRegions(this.cover, columns, cellMm);
  }

  private addShell(
    sums: Sums,
    shell: number,
    count: number,
    at: {
      own: Float32Array;
      up: Float32Array | undefined;
      down: Float32Array | undefined;
      isSmall: Uint8Array;
      window: DepthWindow;
      previous: DepthWindow | undefined;
    },
  ): void {
    const { own, up, down, isSmall } = at;
    const { cellMm } = this.sliced.grid;
    const steepness = USUAL_LAYER_MM / Math.max(USUAL_LAYER_MM, this.sliced.plan.layerMm);
    const insideWalls = at.window.within(count - 1);
    const insidePart = at.window.within(count);
    const insidePartBelow = at.previous?.within(count);
    const below = this.kinds[shell]!;
    const kinds = this.kindsBelow[shell]!;
    this.kinds[shell] = kinds;
    this.kindsBelow[shell] = below;
    kinds.fill(0);
    const inset = this.insetMm;
    for (let i = 0; i < this.insideCount; i += 1) {
      const cell = this.insideCells[i]!;
      const depth = own[cell]!;
      const inner = depth - inset;
      const least = insideWalls[cell]!;
      let room = min(inner, insidePart[cell]!);
      if (depth - least >= LINE_MM) room = min(room, least - inset - STRIP_GROWTH_MM);
      if (up !== undefined && (depth - up[cell]!) * steepness > inset) {
        room = min(room, up[cell]! - SURFACE_MARGIN_MM);
      }
      if (down !== undefined && (depth - down[cell]!) * steepness > inset) {
        room = min(room, down[cell]! - SURFACE_MARGIN_MM);
      }
      const covered = coverOf(room, cellMm);
      sums.sparseMm3 += covered;
      const kind = isSmall[cell] === 1 ? 2 : 1;
      if (kind === 2) sums.smallMm3 += covered;
      else sums.sparseSideMm2 += (covered - coverOf(room - BORDER_STEP_MM, cellMm)) / BORDER_STEP_MM;
      if (room >= 0) kinds[cell] = kind;
      else if (below[cell]! !== 0 && inner >= 0 && insidePartBelow !== undefined) {
        if (insidePartBelow[cell]! - insidePart[cell]! < BRIDGE_WIDTH_MM) continue;
        if (below[cell]! === 2) sums.bridgedSmallMm2 += 1;
        else sums.bridgedMm2 += 1;
      }
    }
  }

  total(layerMm: number): WallProfile {
    return {
      fillMm3: this.fill * layerMm,
      ceilingMm2: this.ceiling,
      shells: this.shells.map((sums) => ({
        ...sums,
        sparseMm3: sums.sparseMm3 * layerMm,
        smallMm3: sums.smallMm3 * layerMm,
        sparseSideMm2: sums.sparseSideMm2 * layerMm,
      })),
    };
  }
}

function emptySums(): Sums {
  return { sparseMm3: 0, smallMm3: 0, sparseSideMm2: 0, bridgedMm2: 0, bridgedSmallMm2: 0 };
}

/** How much of a cell lies beyond a border at this distance from its centre. */
function coverOf(distanceMm: number, cellMm: number): number {
  const share = 0.5 + distanceMm / cellMm;
  return share < 0 ? 0 : share > 1 ? 1 : share;
}
