/** A line of a drawing: x, y in turn, in mm. */
export interface DrawnLine {
  readonly points: readonly number[];
  readonly isClosed: boolean;
}

/**
 * Writes lines as SVG path data (SVG 1.1, 8.3), with relative steps on a grid so that rounding never adds up.
 *
 * @param stepMm the grid, a power of ten.
 */
export function pathData(lines: readonly DrawnLine[], stepMm: number): string {
  const decimals = Math.max(0, Math.round(-Math.log10(stepMm)));
  const text = (steps: number): string => {
    const written = String(Number((steps * stepMm).toFixed(decimals)));
    return written.replace(/^(-?)0\./, '$1.');
  };
  const pair = (x: number, y: number): string => {
    const second = text(y);
    return second.startsWith('-') ? text(x) + second : `${text(x)} ${second}`;
  };
  let path = '';
  for (const { points, isClosed } of lines) {
    let lastX = Math.round(points[0]! / stepMm);
    let lastY = Math.round(points[1]! / stepMm);
    let steps = '';
    for (let i = 2; i < points.length; i += 2) {
      const x = Math.round(points[i]! / stepMm);
      const y = Math.round(points[i + 1]! / stepMm);
      if (x === lastX && y === lastY) continue;
      const step = pair(x - lastX, y - lastY);
      steps += steps !== '' && !step.startsWith('-') ? ` ${step}` : step;
      lastX = x;
      lastY = y;
    }
    if (steps === '') continue;
    path += `M${pair(Math.round(points[0]! / stepMm), Math.round(points[1]! / stepMm))}l${steps}${isClosed ? 'z' : ''}`;
  }
  return path;
}
