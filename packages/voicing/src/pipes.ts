import { openColumnHz, openColumnMm, stoppedColumnHz, stoppedColumnMm, wallSlowing } from './columns.js';
import { endCorrectionMm } from './end-correction.js';
import { positive, zeroOrMore } from './number-checks.js';
import type { Sounding } from './sounding.js';
import { airIn, type Air } from './speed-of-sound.js';
import { centsOf, PRINT_TOLERANCE_MM, type UncertaintyTerm } from './uncertainty.js';
import type { PipeVoice, Room } from './voice.js';
import { VoicingError } from './voicing-error.js';

/**
 * What a blown flue mouth commonly adds, in bores: one. Source: J. Liljencrants, "Recipe for Wooden Organ Flue
 * Pipes" (mmdigest.com): a stopped pipe is a quarter wave less one inner width. A plain open end adds 0.31.
 */
const FLUE_MOUTH_BORES = 1;

/** Above this 2πa/λ the end correction of Levine & Schwinger falls below its low-frequency value. */
const WIDE_BORE_KA = 0.5;
/** Above this slowing the boundary layer is no longer thin against the bore. */
const MOST_WALL_SLOWING = 0.1;
const MEASURED_MOUTH_ERROR = 0.1;

/**
 * How much longer than it is a pipe sounds, both ends together, in mm: a stopped pipe has one open end (its
 * mouth), an open pipe a mouth and a plain open end. Without `mouthCorrectionMm` the mouth counts as a plain
 * open end, which is right for a tube blown across its rim and too little for a flue mouth.
 * @throws VoicingError `bad-number`
 */
export function pipeEndsMm(voice: Omit<PipeVoice, 'lengthMm'>): number {
  const plainMm = endCorrectionMm({ boreMm: voice.boreMm, wallMm: voice.wallMm ?? 0 });
  const mouthMm =
    voice.mouthCorrectionMm === undefined
      ? plainMm
      : zeroOrMore(voice.mouthCorrectionMm, 'mouthCorrectionMm');
  return voice.kind === 'stopped-pipe' ? mouthMm : mouthMm + plainMm;
}

/**
 * The fundamental of a pipe: a quarter wave (stopped) or half a wave (open) in its length and end corrections.
 * Assumes a straight round bore, plane waves, still air at the room's temperature, and no slowing by the walls
 * (they lower a narrow bore by some cents: in the uncertainty). Moves with the speed of sound, so with the
 * temperature: about 3 cents a degree. Source: see `stoppedColumnHz`, `endCorrectionMm`.
 * @throws VoicingError `bad-number`; `out-of-range` for a pipe shorter than its bore, or a bore too narrow
 */
export function soundPipe(voice: PipeVoice, air: Air): Sounding {
  positive(voice.lengthMm, 'lengthMm');
  const endsMm = pipeEndsMm(voice);
  refuseShortPipe(voice.lengthMm, voice.boreMm);
  const column = { lengthMm: voice.lengthMm + endsMm, speedMS: air.speedMS };
  const hz = voice.kind === 'stopped-pipe' ? stoppedColumnHz(column) : openColumnHz(column);
  const slowing = wallSlowing(voice.boreMm, hz);
  refuseNarrowBore(voice.boreMm, hz, slowing);
  return {
    hz,
    terms: [...air.terms, ...pipeTerms(voice, column.lengthMm, slowing)],
    warnings: [...air.warnings, ...pipeWarnings(voice, hz, air.speedMS, slowing)],
  };
}

/**
 * The length of a pipe for a frequency, in mm, the inverse of `soundPipe`.
 * @throws VoicingError `unreachable` where the end corrections alone are longer than the wave allows,
 * `out-of-range` where the pipe would be shorter than its bore
 */
export function pipeLengthMm(voice: Omit<PipeVoice, 'lengthMm'>, hz: number, air: Air): number {
  const endsMm = pipeEndsMm(voice);
  const target = { hz, speedMS: air.speedMS };
  const columnMm = voice.kind === 'stopped-pipe' ? stoppedColumnMm(target) : openColumnMm(target);
  const lengthMm = columnMm - endsMm;
  if (lengthMm <= 0) {
    throw new VoicingError(
      'unreachable',
      `No pipe of ${voice.boreMm} mm bore sounds ${hz.toFixed(1)} Hz: its ends alone are longer. Take a narrower bore.`,
      'boreMm',
    );
  }
  refuseShortPipe(lengthMm, voice.boreMm);
  refuseNarrowBore(voice.boreMm, hz, wallSlowing(voice.boreMm, hz));
  return lengthMm;
}

/**
 * The mouth correction of a printed pipe from the pitch it sounds, in mm: its sounding length less its own, and
 * less the plain open end where it has one. One pipe of a rank measured so makes the others predictable.
 * @param measuredHz the fundamental heard, Hz
 * @throws VoicingError `bad-number`; `out-of-range` where the pitch is too high for a pipe of this length
 */
export function mouthCorrectionFromMm(voice: PipeVoice, measuredHz: number, room: Room): number {
  const target = { hz: measuredHz, speedMS: airIn(room).speedMS };
  const columnMm = voice.kind === 'stopped-pipe' ? stoppedColumnMm(target) : openColumnMm(target);
  const mouthMm =
    columnMm - positive(voice.lengthMm, 'lengthMm') - pipeEndsMm({ ...voice, mouthCorrectionMm: 0 });
  if (mouthMm < 0) {
    throw new VoicingError(
      'out-of-range',
      `A pipe ${voice.lengthMm} mm long cannot sound as high as ${measuredHz.toFixed(1)} Hz: ` +
        'check the length, or it jumped to a higher partial.',
      'measuredHz',
    );
  }
  return mouthMm;
}

function refuseShortPipe(lengthMm: number, boreMm: number): void {
  if (lengthMm >= boreMm) return;
  throw new VoicingError(
    'out-of-range',
    `A pipe ${lengthMm.toFixed(1)} mm long with a bore of ${boreMm} mm is wider than long: ` +
      'the pipe formula does not hold. Take a narrower bore.',
    'boreMm',
  );
}

function refuseNarrowBore(boreMm: number, hz: number, slowing: number): void {
  if (slowing <= MOST_WALL_SLOWING) return;
  throw new VoicingError(
    'out-of-range',
    `A bore of ${boreMm} mm is too narrow for ${hz.toFixed(0)} Hz: the walls hold the air back. Make it wider.`,
    'boreMm',
  );
}

function pipeTerms(voice: PipeVoice, columnMm: number, slowing: number): UncertaintyTerm[] {
  const plainMm = endCorrectionMm({ boreMm: voice.boreMm, wallMm: voice.wallMm ?? 0 });
  const mouthErrorMm =
    voice.mouthCorrectionMm === undefined
      ? FLUE_MOUTH_BORES * voice.boreMm - plainMm
      : MEASURED_MOUTH_ERROR * voice.mouthCorrectionMm;
  const terms = [
    { from: 'the mouth', cents: centsOf(mouthErrorMm / columnMm) },
    { from: 'the printed length, by 0.2 mm', cents: centsOf(PRINT_TOLERANCE_MM / columnMm) },
    { from: 'the walls of the bore slow the wave', cents: centsOf(slowing) },
  ];
  if (voice.kind === 'open-pipe') {
    // Measured and computed plain ends differ by a few hundredths of the radius (0.6127 against 0.6133 of theory).
    terms.push({ from: 'the open end', cents: centsOf((0.05 * voice.boreMm) / 2 / columnMm) });
  }
  return terms;
}

function pipeWarnings(voice: PipeVoice, hz: number, speedMS: number, slowing: number): string[] {
  const warnings: string[] = [];
  const ka = (Math.PI * hz * voice.boreMm) / 1000 / speedMS;
  if (ka > WIDE_BORE_KA) {
    warnings.push(
      `A bore of ${voice.boreMm} mm is wide for this pitch: the end correction is smaller there, ` +
        'and the pipe will sound sharper than computed.',
    );
  }
  if (centsOf(slowing) > 20) {
    warnings.push(
      `A bore of ${voice.boreMm} mm is narrow for this pitch: its walls lower it by about ` +
        `${centsOf(slowing).toFixed(0)} cents, which the figure leaves out.`,
    );
  }
  if (voice.mouthCorrectionMm === undefined) {
    const plainMm = endCorrectionMm({ boreMm: voice.boreMm, wallMm: voice.wallMm ?? 0 });
    warnings.push(
      `The mouth is counted as a plain open end (${plainMm.toFixed(1)} mm), right for a pipe blown across its rim. ` +
        `A flue mouth adds about ${(FLUE_MOUTH_BORES * voice.boreMm).toFixed(0)} mm: measure one pipe and give ` +
        'its mouth correction.',
    );
  } else if (voice.mouthCorrectionMm > 3 * voice.boreMm) {
    warnings.push(
      `A mouth correction of ${voice.mouthCorrectionMm} mm is more than three bores: check it, one bore is common.`,
    );
  }
  return warnings;
}
