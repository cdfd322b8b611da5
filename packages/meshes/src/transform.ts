/** An affine map of row vectors, as 3MF writes it: m00 m01 m02 m10 … m32; the last three are the shift. */
export type Transform = readonly number[];

export const IDENTITY: Transform = [1, 0, 0, 0, 1, 0, 0, 0, 1, 0, 0, 0];

/** First `inner`, then `outer` (3MF core specification 1.3, 3.3: v′ = v · inner · outer). */
export function compose(inner: Transform, outer: Transform): Transform {
  const result: number[] = [];
  for (let row = 0; row < 4; row += 1) {
    for (let column = 0; column < 3; column += 1) {
      let sum = row === 3 ? outer[9 + column]! : 0;
      for (let k = 0; k < 3; k += 1) sum += inner[3 * row + k]! * outer[3 * k + column]!;
      result.push(sum);
    }
  }
  return result;
}

/** Negative where the map mirrors; 0 where it flattens. */
export function determinant(m: Transform): number {
  return (
    m[0]! * (m[4]! * m[8]! - m[5]! * m[7]!) -
    m[1]! * (m[3]! * m[8]! - m[5]! * m[6]!) +
    m[2]! * (m[3]! * m[7]! - m[4]! * m[6]!)
  );
}

/** Twelve finite numbers parted by white space, or null. */
export function parseTransform(text: string): Transform | null {
  const numbers = text.trim().split(/\s+/).map(Number);
  return numbers.length === 12 && numbers.every(Number.isFinite) ? numbers : null;
}
