import type { Plan, PlanPoint } from './plan.js';
import { SolidBuilder, type Solid } from './solid.js';
import { triangulate } from './triangulate.js';

/**
 * A piece of the plan and the heights between which it is filled. Neighbouring cells must share the
 * corners along their common border.
 */
export interface Cell {
  readonly plan: Plan;
  readonly holes?: readonly Plan[];
  readonly filledMm: readonly (readonly [fromZ: number, toZ: number])[];
}

/**
 * A solid from cells of a plan, each filled between its own heights: good for grooves, windows and
 * terraces. Faces appear only where filled meets empty, so the result is closed by construction;
 * cells must not touch along a single edge alone.
 */
export function cellSolid(cells: readonly Cell[]): Solid {
  const builder = new SolidBuilder();
  const levels = [...new Set(cells.flatMap((cell) => cell.filledMm.flat()))].sort((a, b) => a - b);
  const isFilled = (cell: Cell | undefined, level: number): boolean => {
    const [from, to] = [levels[level], levels[level + 1]];
    if (!cell || from === undefined || to === undefined) return false;
    return cell.filledMm.some(([low, high]) => low <= from && high >= to);
  };
  const owner = new Map<string, Cell>();
  for (const cell of cells) {
    for (const [from, to] of edgesOf(cell)) owner.set(edgeKey(from, to), cell);
  }
  for (const cell of cells) {
    addLevelFaces(builder, cell, levels, (level) => isFilled(cell, level));
    for (const [from, to] of edgesOf(cell)) {
      const neighbour = owner.get(edgeKey(to, from));
      levels.slice(0, -1).forEach((z, level) => {
        if (!isFilled(cell, level) || isFilled(neighbour, level)) return;
        const top = levels[level + 1] ?? z;
        builder.quad(
          builder.vertex(...from, z),
          builder.vertex(...to, z),
          builder.vertex(...to, top),
          builder.vertex(...from, top),
        );
      });
    }
  }
  return builder.build();
}

function addLevelFaces(
  builder: SolidBuilder,
  cell: Cell,
  levels: number[],
  isFilled: (level: number) => boolean,
): void {
  const points = [...cell.plan, ...(cell.holes ?? []).flat()];
  const triangles = triangulate(cell.plan, cell.holes);
  levels.forEach((z, level) => {
    const isAbove = isFilled(level);
    if (isAbove === isFilled(level - 1)) return;
    const corners = points.map(([x, y]) => builder.vertex(x, y, z));
    for (const [a, b, c] of triangles) {
      const [second, third] = isAbove ? [c, b] : [b, c];
      builder.triangle(corners[a] ?? -1, corners[second] ?? -1, corners[third] ?? -1);
    }
  });
}

/** Borders with the cell on their left: its outline as it runs, its holes the other way. */
function edgesOf(cell: Cell): [PlanPoint, PlanPoint][] {
  return [cell.plan, ...(cell.holes ?? []).map((hole) => hole.toReversed())].flatMap((loop) =>
    loop.map((point, index): [PlanPoint, PlanPoint] => [point, loop[(index + 1) % loop.length] ?? point]),
  );
}

const tenthsOfMicrometre = (mm: number) => Math.round(mm * 10_000);
const edgeKey = (from: PlanPoint, to: PlanPoint) => [...from, ...to].map(tenthsOfMicrometre).join(' ');
