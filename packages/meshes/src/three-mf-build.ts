import type { LengthUnit } from './mesh.js';
import type { Refuse } from './mesh-error.js';
import type { ModelObject, ModelPart, Placing } from './three-mf-model.js';
import { IDENTITY, compose, determinant, type Transform } from './transform.js';

export interface BuildSource {
  readonly rootName: string;
  readonly partAt: (path: string) => ModelPart;
  readonly unit: LengthUnit;
  readonly unitMm: number;
  readonly maxTriangles: number;
  /** Turns a path as written into the key that `partAt` takes. */
  readonly normalise: (path: string) => string;
}

/** Components may double at every level; a real assembly places far fewer. */
const MAX_PLACINGS = 10_000;
const MAX_DEPTH = 64;

interface Tally {
  readonly triangles: number;
  readonly placings: number;
}

/**
 * Expands build items and components to corners in mm. Everything is counted before anything is expanded,
 * so that a small file cannot ask for much memory. A mirroring transform swaps two corners of each triangle,
 * which keeps the outside outside.
 *
 * @throws MeshError `nothing-to-build`, `unknown-object`, `component-cycle`, `too-many-triangles`,
 * `no-triangles`, `bad-model`.
 */
export function expandBuild(source: BuildSource, refuse: Refuse): Float64Array {
  const { items } = source.partAt(source.rootName);
  if (items.length === 0)
    throw refuse('nothing-to-build', 'builds nothing: its build list is empty. Export it again.');
  const counter = new Counter(source, refuse);
  let triangles = 0;
  let placings = 0;
  for (const item of items) {
    const tally = counter.count(item, source.rootName, 0);
    triangles += tally.triangles;
    placings += tally.placings;
  }
  if (placings > MAX_PLACINGS || triangles > source.maxTriangles) {
    throw refuse(
      'too-many-triangles',
      `places its objects ${placings} times, which makes ${triangles} triangles; at most ${MAX_PLACINGS} times and ${source.maxTriangles} triangles are read.`,
    );
  }
  if (triangles === 0) throw refuse('no-triangles', 'holds no triangles; export the part again as a mesh.');
  const writer = new Writer(source, triangles);
  for (const item of items) writer.place(item, source.rootName, IDENTITY);
  if (!writer.corners.every(Number.isFinite)) {
    throw refuse('non-finite-coordinate', 'cannot be read: its transforms move a corner out of all bounds.');
  }
  return writer.corners;
}

function resolve(source: BuildSource, placing: Placing, partName: string) {
  const name = placing.partPath === null ? partName : source.normalise(placing.partPath);
  const part = source.partAt(name);
  return { name, part, object: part.objects.get(placing.objectId) };
}

class Counter {
  private readonly known = new Map<ModelObject, Tally | 'open'>();

  constructor(
    private readonly source: BuildSource,
    private readonly refuse: Refuse,
  ) {}

  count(placing: Placing, partName: string, depth: number): Tally {
    const { name, part, object } = resolve(this.source, placing, partName);
    if (object === undefined) {
      throw this.refuse(
        'unknown-object',
        `cannot be read: it places object ${placing.objectId || '(none)'}, which “${name}” does not hold.`,
      );
    }
    if ((part.unit ?? 'millimeter') !== this.source.unit) {
      throw this.refuse(
        'bad-model',
        `cannot be read: “${name}” and “${this.source.rootName}” state different units.`,
      );
    }
    const before = this.known.get(object);
    if (before === 'open') {
      throw this.refuse('component-cycle', `cannot be read: object ${object.id} is a component of itself.`);
    }
    if (before !== undefined) return before;
    if (depth > MAX_DEPTH)
      throw this.refuse('bad-model', `cannot be read: its components go more than ${MAX_DEPTH} levels deep.`);
    this.known.set(object, 'open');
    let triangles = object.indices.length / 3;
    let placings = 1;
    for (const component of object.components) {
      const below = this.count(component, name, depth + 1);
      triangles += below.triangles;
      placings += below.placings;
    }
    const tally = { triangles, placings };
    this.known.set(object, tally);
    return tally;
  }
}

class Writer {
  readonly corners: Float64Array;
  private used = 0;

  constructor(
    private readonly source: BuildSource,
    triangles: number,
  ) {
    this.corners = new Float64Array(9 * triangles);
  }

  place(placing: Placing, partName: string, outer: Transform): void {
    const { name, object } = resolve(this.source, placing, partName);
    if (object === undefined) return;
    const transform = compose(placing.transform, outer);
    this.write(object, transform);
    for (const component of object.components) this.place(component, name, transform);
  }

  private write(object: ModelObject, m: Transform): void {
    const vertices = object.vertices.values;
    const indices = object.indices.values;
    const placed = new Float64Array(vertices.length);
    for (let i = 0; i < vertices.length; i += 3) {
      const x = vertices[i]!,
        y = vertices[i + 1]!,
        z = vertices[i + 2]!;
      for (let axis = 0; axis < 3; axis += 1) {
        placed[i + axis] =
          this.source.unitMm * (x * m[axis]! + y * m[3 + axis]! + z * m[6 + axis]! + m[9 + axis]!);
      }
    }
    const isMirrored = determinant(m) < 0;
    for (let i = 0; i < indices.length; i += 3) {
      this.copy(placed, indices[i]!);
      this.copy(placed, indices[isMirrored ? i + 2 : i + 1]!);
      this.copy(placed, indices[isMirrored ? i + 1 : i + 2]!);
    }
  }

  private copy(placed: Float64Array, vertex: number): void {
    for (let axis = 0; axis < 3; axis += 1) this.corners[this.used + axis] = placed[3 * vertex + axis]!;
    this.used += 3;
  }
}
