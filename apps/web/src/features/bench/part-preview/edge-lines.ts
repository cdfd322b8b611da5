import { BufferGeometry, Float32BufferAttribute, Triangle, Vector3 } from 'three';

/** Facets of a round wall meet at less, the roundings of a coarse likeness too. */
const edgeDeg = 48;
/** Faces thinner than this share of the part's radius are what rounding left, and have no edges of their own. */
const sliverShare = 0.015;
/** Places nearer than this, in mm, are one. */
const sameMm = 0.01;

/** From the longest side to the corner across. */
const thicknessOf = (face: Triangle): number => {
  const longest = Math.max(face.a.distanceTo(face.b), face.b.distanceTo(face.c), face.c.distanceTo(face.a));
  return (2 * face.getArea()) / longest;
};
const nameOf = ({ x, y, z }: Vector3) => [x, y, z].map((one) => Math.round(one / sameMm)).join();

/**
 * Lines where two faces meet at an angle to the eye. Unlike the library's own it leaves out what has a face on one
 * side only: in a coarse likeness such edges are where slivers were dropped, and no edges of the part.
 */
export function edgeLines(model: BufferGeometry): BufferGeometry {
  const points = model.getAttribute('position');
  const sharp = Math.cos((edgeDeg * Math.PI) / 180);
  const thinnest = sliverShare * (model.boundingSphere?.radius ?? 0);
  const seen = new Map<string, Vector3>();
  const lines: number[] = [];
  for (let at = 0; at < points.count; at += 3) {
    const face = new Triangle().setFromAttributeAndIndices(points, at, at + 1, at + 2);
    if (thicknessOf(face) < thinnest) continue;
    const normal = face.getNormal(new Vector3());
    const corners = [face.a, face.b, face.c];
    const names = corners.map(nameOf);
    for (let side = 0; side < 3; side += 1) {
      const next = (side + 1) % 3;
      const other = seen.get(`${names[next]} ${names[side]}`);
      if (!other) seen.set(`${names[side]} ${names[next]}`, normal);
      else if (normal.dot(other) < sharp)
        lines.push(...corners[side]!.toArray(), ...corners[next]!.toArray());
    }
  }
  return new BufferGeometry().setAttribute('position', new Float32BufferAttribute(lines, 3));
}
