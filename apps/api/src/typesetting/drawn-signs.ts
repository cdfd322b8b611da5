import { inks } from './page-geometry.js';

type Pen = Pick<PDFKit.PDFDocument, 'moveTo' | 'lineTo' | 'rect' | 'lineWidth' | 'stroke' | 'strokeColor'>;

/**
 * A sign that Source Sans 3 does not have, drawn with lines. `standIn` is set unseen below it, so that
 * reading aloud, searching and copying find the sign itself.
 */
export interface DrawnSign {
  readonly standIn: string;
  /** Of the type size. */
  readonly widthEm: number;
  /** At the left end of its place on the baseline, with y running down. */
  draw(pen: Pen, x: number, baselineY: number, size: number, colour: string): void;
}

type Stroke = readonly (readonly [xEm: number, yEm: number])[];

const strokes = (
  widthEm: number,
  standIn: string,
  lines: readonly Stroke[],
  weightEm = 0.055,
): DrawnSign => ({
  standIn,
  widthEm,
  draw(pen, x, baselineY, size, colour) {
    pen.strokeColor(colour).lineWidth(weightEm * size);
    for (const line of lines) {
      line.forEach(([xEm, yEm], at) => {
        if (at === 0) pen.moveTo(x + xEm * size, baselineY - yEm * size);
        else pen.lineTo(x + xEm * size, baselineY - yEm * size);
      });
      pen.stroke();
    }
  },
});

const signs: Record<string, DrawnSign> = {
  '♯': strokes(0.43, '#', [
    [
      [0.14, -0.06],
      [0.14, 0.66],
    ],
    [
      [0.29, 0.0],
      [0.29, 0.72],
    ],
    [
      [0.045, 0.16],
      [0.385, 0.25],
    ],
    [
      [0.045, 0.41],
      [0.385, 0.5],
    ],
  ]),
  '♭': strokes(0.38, 'b', [
    [
      [0.07, 0.78],
      [0.07, 0.0],
      [0.2, 0.1],
      [0.29, 0.23],
      [0.3, 0.34],
      [0.22, 0.4],
      [0.13, 0.37],
      [0.07, 0.3],
    ],
  ]),
  '→': strokes(0.86, '>', [
    [
      [0.07, 0.3],
      [0.78, 0.3],
    ],
    [
      [0.57, 0.48],
      [0.78, 0.3],
      [0.57, 0.12],
    ],
  ]),
  '←': strokes(0.86, '<', [
    [
      [0.78, 0.3],
      [0.07, 0.3],
    ],
    [
      [0.28, 0.48],
      [0.07, 0.3],
      [0.28, 0.12],
    ],
  ]),
  '⌀': strokes(0.62, 'O', [
    Array.from({ length: 25 }, (_, at): [number, number] => [
      0.31 + 0.23 * Math.cos((at * Math.PI) / 12),
      0.32 + 0.23 * Math.sin((at * Math.PI) / 12),
    ]),
    [
      [0.06, 0.05],
      [0.56, 0.6],
    ],
  ]),
  '≤': strokes(0.52, '<', [
    [
      [0.45, 0.56],
      [0.07, 0.38],
      [0.45, 0.2],
    ],
    [
      [0.07, 0.06],
      [0.45, 0.06],
    ],
  ]),
  '≥': strokes(0.52, '>', [
    [
      [0.07, 0.56],
      [0.45, 0.38],
      [0.07, 0.2],
    ],
    [
      [0.07, 0.06],
      [0.45, 0.06],
    ],
  ]),
  '✓': strokes(
    0.6,
    'v',
    [
      [
        [0.07, 0.3],
        [0.22, 0.1],
        [0.52, 0.58],
      ],
    ],
    0.075,
  ),
};

/** For what neither the typeface nor the list above has: an empty box of a letter's size. */
const box: DrawnSign = {
  standIn: 'o',
  widthEm: 0.62,
  draw(pen, x, baselineY, size) {
    pen.strokeColor(inks.soft).lineWidth(0.04 * size);
    pen.rect(x + 0.08 * size, baselineY - 0.6 * size, 0.46 * size, 0.6 * size).stroke();
  },
};

export const drawnSign = (sign: string): DrawnSign => signs[sign] ?? box;
