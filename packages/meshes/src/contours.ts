import { NOTHING, type DepthBuffer } from './depth-buffer.js';

/** Outgoing steps along the border of the covered cells: right, down, left, up. */
const STEP_X = [1, 0, -1, 0];
const STEP_Y = [0, 1, 0, -1];
const MIN_LOOP_STEPS = 8;

/**
 * Traces the borders between covered and empty cells as closed loops of grid points (x, y in turn), outer
 * borders one way round, holes the other. Cells that touch at a corner only stay apart.
 */
export function traceContours(buffer: DepthBuffer): Float64Array[] {
  const outgoing = outgoingSteps(buffer);
  const width = buffer.columns + 1;
  const loops: Float64Array[] = [];
  for (let start = 0; start < outgoing.length; start += 1) {
    while (outgoing[start] !== 0) {
      const loop = follow(outgoing, width, start);
      if (loop.length >= 2 * MIN_LOOP_STEPS) loops.push(Float64Array.from(loop));
    }
  }
  return loops;
}

function follow(outgoing: Uint8Array, width: number, start: number): number[] {
  const loop: number[] = [];
  let at = start;
  let heading = -1;
  do {
    const next = nextHeading(outgoing[at]!, heading);
    outgoing[at]! &= ~(1 << next);
    loop.push(at % width, Math.floor(at / width));
    heading = next;
    at += STEP_X[heading]! + STEP_Y[heading]! * width;
  } while (at !== start);
  return loop;
}

/** Where two borders meet, turning right keeps the loop on its own cell. */
function nextHeading(steps: number, heading: number): number {
  if (heading < 0) return 31 - Math.clz32(steps & -steps);
  for (const turn of [1, 0, 3]) {
    const candidate = (heading + turn) % 4;
    if ((steps & (1 << candidate)) !== 0) return candidate;
  }
  return heading;
}

function outgoingSteps({ columns, rows, depths }: DepthBuffer): Uint8Array {
  const width = columns + 1;
  const outgoing = new Uint8Array(width * (rows + 1));
  const isCovered = (column: number, row: number): boolean => depths[row * columns + column]! < NOTHING;
  for (let row = 1; row < rows - 1; row += 1) {
    for (let column = 1; column < columns - 1; column += 1) {
      if (!isCovered(column, row)) continue;
      const corner = row * width + column;
      // Clockwise round each cell, so that neighbours' shared sides cancel and the border remains.
      if (!isCovered(column, row - 1)) outgoing[corner]! |= 1;
      if (!isCovered(column + 1, row)) outgoing[corner + 1]! |= 2;
      if (!isCovered(column, row + 1)) outgoing[corner + width + 1]! |= 4;
      if (!isCovered(column - 1, row)) outgoing[corner + width]! |= 8;
    }
  }
  return outgoing;
}
