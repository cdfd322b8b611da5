/** Quality factors of second-order sections that make a Butterworth filter of order 4 and of order 8. */
const fourthOrder = [0.5412, 1.3066];
const eighthOrder = [0.5098, 0.6013, 0.9, 2.5629];
/** Half an octave, with a little room: farther off the tuner does not call a pitch this voice's. */
const edgeRatio = 1.45;
/** Of the sample rate; above it the sections would no longer be what they are named for. */
const highestOfRate = 0.45;

type Section = readonly [b0: number, b1: number, b2: number, a1: number, a2: number];

/** Second-order low-pass and high-pass sections. Source: R. Bristow-Johnson, "Audio EQ Cookbook". */
function sectionOf(kind: 'low-pass' | 'high-pass', edgeOfRate: number, quality: number): Section {
  const turn = 2 * Math.PI * edgeOfRate;
  const alpha = Math.sin(turn) / (2 * quality);
  const cos = Math.cos(turn);
  const a0 = 1 + alpha;
  const side = (kind === 'low-pass' ? 1 - cos : 1 + cos) / 2 / a0;
  return [side, kind === 'low-pass' ? 2 * side : -2 * side, side, (-2 * cos) / a0, (1 - alpha) / a0];
}

function pass(samples: Float32Array, [b0, b1, b2, a1, a2]: Section): void {
  let [x1, x2, y1, y2] = [0, 0, 0, 0];
  for (let at = 0; at < samples.length; at += 1) {
    const x = samples[at]!;
    const y = b0 * x + b1 * x1 + b2 * x2 - a1 * y1 - a2 * y2;
    [x2, x1, y2, y1] = [x1, x, y1, y];
    samples[at] = y;
  }
}

/**
 * What lies within half an octave of a pitch, above and below. A bar's or tine's overtones stand in no whole ratio
 * to its fundamental, and a detector of periods is off by half a semitone while they sound; without them it is not.
 * The beginning of the result is still swinging in.
 */
export function bandAround(hz: number, samples: Float32Array, sampleRate: number): Float32Array {
  const band = samples.slice();
  const low = hz / edgeRatio / sampleRate;
  const high = Math.min((hz * edgeRatio) / sampleRate, highestOfRate);
  for (const quality of eighthOrder) pass(band, sectionOf('low-pass', high, quality));
  for (const quality of fourthOrder) pass(band, sectionOf('high-pass', low, quality));
  return band;
}
