import type { Corners } from './triangulate.js';

export type Vertex = readonly [xMm: number, yMm: number, zMm: number];

/** A closed surface in mm; triangles run counter-clockwise seen from outside. */
export interface Solid {
  readonly vertices: readonly Vertex[];
  readonly triangles: readonly Corners[];
}

/** Coordinates are kept to 0.0001 mm: far below what a printer resolves, far above noise of arithmetic. */
const stepsPerMm = 10_000;
const rounded = (mm: number) => Math.round(mm * stepsPerMm) / stepsPerMm + 0;

/** Collects triangles; corners at the same place become one vertex, so that faces share their edges. */
export class SolidBuilder {
  readonly #vertices: Vertex[] = [];
  readonly #indexOf = new Map<string, number>();
  readonly #triangles: Corners[] = [];

  vertex(x: number, y: number, z: number): number {
    const place: Vertex = [rounded(x), rounded(y), rounded(z)];
    const key = place.join(' ');
    const known = this.#indexOf.get(key);
    if (known !== undefined) return known;
    this.#vertices.push(place);
    this.#indexOf.set(key, this.#vertices.length - 1);
    return this.#vertices.length - 1;
  }

  /** A triangle whose corners partly coincide has no area and is left out. */
  triangle(a: number, b: number, c: number): void {
    if (a !== b && b !== c && c !== a) this.#triangles.push([a, b, c]);
  }

  quad(a: number, b: number, c: number, d: number): void {
    this.triangle(a, b, c);
    this.triangle(a, c, d);
  }

  build(): Solid {
    return { vertices: this.#vertices, triangles: this.#triangles };
  }
}

export function vertexOf(solid: Solid, index: number): Vertex {
  const vertex = solid.vertices[index];
  if (!vertex) throw new RangeError(`A triangle names vertex ${index}, which does not exist.`);
  return vertex;
}

/** Volume by the divergence theorem: the sum of signed tetrahedra to the origin, in mm³. */
export function volumeMm3(solid: Solid): number {
  let six = 0;
  for (const corners of solid.triangles) {
    const [[ax, ay, az], [bx, by, bz], [cx, cy, cz]] = [0, 1, 2].map((corner) =>
      vertexOf(solid, corners[corner] ?? -1),
    ) as [Vertex, Vertex, Vertex];
    six += ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
  }
  return six / 6;
}

export interface Bounds {
  readonly min: Vertex;
  readonly max: Vertex;
  readonly size: Vertex;
}

export function boundsOf(solid: Solid): Bounds {
  const axis = (index: 0 | 1 | 2) => solid.vertices.map((vertex) => vertex[index]);
  const lowest = (values: number[]) => values.reduce((a, b) => Math.min(a, b), Infinity);
  const highest = (values: number[]) => values.reduce((a, b) => Math.max(a, b), -Infinity);
  const min: Vertex = [lowest(axis(0)), lowest(axis(1)), lowest(axis(2))];
  const max: Vertex = [highest(axis(0)), highest(axis(1)), highest(axis(2))];
  return { min, max, size: [max[0] - min[0], max[1] - min[1], max[2] - min[2]] };
}

/** Laid along x on the bed: what pointed up points along x. */
export function laidAlongX(solid: Solid): Solid {
  const builder = new SolidBuilder();
  const lowest = -boundsOf(solid).max[0];
  const indices = solid.vertices.map(([x, y, z]) => builder.vertex(z, y, -x - lowest));
  for (const [a, b, c] of solid.triangles) {
    builder.triangle(indices[a] ?? -1, indices[b] ?? -1, indices[c] ?? -1);
  }
  return builder.build();
}

/**
 * Edges that keep a solid from being closed and rightly wound: each edge must be walked exactly once
 * in either direction. Returns how many directed edges break that rule; 0 for a sound solid.
 */
export function edgeFaults(solid: Solid): number {
  const walked = new Map<string, number>();
  for (const [a, b, c] of solid.triangles) {
    for (const [from, to] of [
      [a, b],
      [b, c],
      [c, a],
    ]) {
      const key = `${from} ${to}`;
      walked.set(key, (walked.get(key) ?? 0) + 1);
    }
  }
  let faults = 0;
  for (const [key, times] of walked) {
    const [from, to] = key.split(' ');
    if (times !== 1 || walked.get(`${to} ${from}`) !== 1) faults += 1;
  }
  return faults;
}
