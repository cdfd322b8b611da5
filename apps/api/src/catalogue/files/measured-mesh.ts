import type { Measurement as MeshMeasurement } from '@windchest/meshes';
import type { PrintProfile } from '@windchest/plates';

/** What the measuring room finds out about a mesh, as it is kept. */
export interface MeasuredMesh extends MeshMeasurement {
  /** Size of the coarse likeness in the storage, where one was made. */
  previewBytes?: number;
}

export interface Drawing {
  path: string;
  edges: string;
  widthMm: number;
  heightMm: number;
  viewBox: string;
}
export interface Drawings {
  front: Drawing;
  side: Drawing;
  top: Drawing;
}

/** All that is kept of one mesh. */
export interface MeshFindings {
  readonly measurement: MeshMeasurement;
  readonly geometryHash: string;
  readonly drawings: Drawings;
  /** What estimates of filament and time need, and the convex outline from above. */
  readonly printProfile: PrintProfile;
  readonly footprint: readonly (readonly [number, number])[];
  /** The coarse likeness, under its hash in the storage. */
  readonly preview: { readonly sha256: string; readonly bytes: number };
}

/** The side that tells most about a part: the one that shows most of it. */
export const tellingDrawing = (drawings: Drawings | null): Drawing | null => {
  if (!drawings) return null;
  const sides = [drawings.front, drawings.side, drawings.top];
  return sides.reduce((best, one) =>
    one.widthMm * one.heightMm > best.widthMm * best.heightMm ? one : best,
  );
};
