/** Units a mesh file may state (3MF core specification, 3.4 Model: `unit`). */
export type LengthUnit = 'micron' | 'millimeter' | 'centimeter' | 'inch' | 'foot' | 'meter';

/** A triangle soup in millimetres, as read from a file; nothing is repaired or merged. */
export interface Mesh {
  readonly format: 'stl-binary' | 'stl-ascii' | '3mf';
  /** Number of triangles. */
  readonly triangles: number;
  /** x, y, z of three corners for each triangle, in mm: 9 × `triangles` numbers. */
  readonly corners: Float32Array | Float64Array;
  /** The unit the file states; STL states none. */
  readonly statedUnit: LengthUnit | null;
}
