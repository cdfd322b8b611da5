export {
  barHz,
  barSupportMm,
  FREE_BAR_NODE,
  FREE_BAR_ROOTS,
  TINE_ROOTS,
  youngsModulusFromBarGPa,
} from './bars.js';
export { openColumnHz, openColumnMm, stoppedColumnHz, stoppedColumnMm, wallSlowing } from './columns.js';
export { compassOf } from './compass.js';
export { endCorrectionMm, FLANGED_END_RADII, PISTON_END_RADII } from './end-correction.js';
export { STANDARD_PRESSURE_PA } from './humid-air.js';
export { holeForMm, lengthForMm, volumeForCm3 } from './length-for.js';
export { PRINTED_MODULUS_GPA, type ModulusRange, type PrintedMaterial } from './materials.js';
export {
  centsBetween,
  hzToNote,
  midiToNote,
  noteLabel,
  noteToHz,
  noteToMidi,
  STANDARD_A4_HZ,
  type NearestNote,
  type Tuning,
} from './notes.js';
export { isSustained, partialsOf, type VoicePartial } from './partials.js';
export { mouthCorrectionFromMm, pipeEndsMm } from './pipes.js';
export { predict, uncertaintyOf, type Prediction } from './predict.js';
export { SPEED_FORMULAS, type SpeedFormula, type SpeedFormulaId } from './speed-formulas.js';
export { speedOfSound, type AirInput } from './speed-of-sound.js';
export { stringHz, stringTensionN } from './strings.js';
export { targetInRoomHz, trimAdvice, type TrimAdvice, type TrimOptions } from './trim.js';
export type { UncertaintyTerm } from './uncertainty.js';
export { helmholtzHz, neckSoundingMm } from './vessel.js';
export {
  VOICE_KINDS,
  type BarVoice,
  type PipeVoice,
  type Room,
  type StringVoice,
  type TargetedVoice,
  type VesselVoice,
  type Voice,
  type VoiceKind,
} from './voice.js';
export { VoicingError, type VoicingErrorCode } from './voicing-error.js';
