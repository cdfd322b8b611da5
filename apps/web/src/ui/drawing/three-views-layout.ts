export interface Point3 {
  x: number;
  y: number;
  z: number;
}
/** A part's box in the coordinates of its file, mm. */
export interface Box3 {
  min: Point3;
  max: Point3;
}
export const viewNames = ['top', 'front', 'side'] as const;
export type ViewName = (typeof viewNames)[number];

/** A view on the sheet: px of its upper left corner, and how large the part is there. */
export interface PlacedView {
  x: number;
  y: number;
  widthPx: number;
  heightPx: number;
}
export interface ThreeViewsLayout {
  pxPerMm: number;
  widthPx: number;
  heightPx: number;
  views: Record<ViewName, PlacedView>;
}

/** Room for the lettered sizes at the left and below, and for a callout at the right of the front view. */
const left = 32;
const below = 30;
const beside = 64;
const above = 28;
/** Larger than this a small part looks like a large one. */
const mostPxPerMm = 6;

export const boxAround = (a: Box3, b: Box3): Box3 => ({
  min: { x: Math.min(a.min.x, b.min.x), y: Math.min(a.min.y, b.min.y), z: Math.min(a.min.z, b.min.z) },
  max: { x: Math.max(a.max.x, b.max.x), y: Math.max(a.max.y, b.max.y), z: Math.max(a.max.z, b.max.z) },
});

export const sizeOf = ({ min, max }: Box3): Point3 => ({
  x: max.x - min.x,
  y: max.y - min.y,
  z: max.z - min.z,
});

/** The view from above over the one from the front, the one from the right beside it, to one scale. */
export function layOutThreeViews(
  box: Box3,
  room: { widthPx: number; maxHeightPx: number },
): ThreeViewsLayout {
  const { x, y, z } = sizeOf(box);
  const pxPerMm = Math.max(
    0,
    Math.min(
      (room.widthPx - left - beside - 1) / (x + y),
      (room.maxHeightPx - below - above - 2) / (y + z),
      mostPxPerMm,
    ),
  );
  const [width, depth, height] = [x * pxPerMm, y * pxPerMm, z * pxPerMm];
  const underTop = 1 + depth + above;
  return {
    pxPerMm,
    widthPx: left + width + beside + depth + 1,
    heightPx: underTop + height + below + 1,
    views: {
      top: { x: left, y: 1, widthPx: width, heightPx: depth },
      front: { x: left, y: underTop, widthPx: width, heightPx: height },
      side: { x: left + width + beside, y: underTop, widthPx: depth, heightPx: height },
    },
  };
}

/** Where a point of the file stands in each view, mm right of and below the view's upper left corner. */
export const placeInViews = (
  place: Point3,
  { min, max }: Box3,
): Record<ViewName, { x: number; y: number }> => ({
  top: { x: place.x - min.x, y: max.y - place.y },
  front: { x: place.x - min.x, y: max.z - place.z },
  side: { x: place.y - min.y, y: max.z - place.z },
});

/** Where a part's own drawings begin in each view: the upper left corner of its box. */
export const cornersInViews = (
  { min, max }: Box3,
  around: Box3,
): Record<ViewName, { x: number; y: number }> => ({
  ...placeInViews({ x: min.x, y: max.y, z: max.z }, around),
  // From the right, the front of the part is at the left.
  side: placeInViews({ x: min.x, y: min.y, z: max.z }, around).side,
});
