/**
 * Why a computation was refused:
 * - `bad-note`: the text is no note name;
 * - `bad-number`: not a finite number, or not above zero where it must be;
 * - `bad-kind`: no kind of voice;
 * - `out-of-range`: a fair number, but outside what the formula was made for;
 * - `unreachable`: no length, hole or volume of this voice gives the note;
 * - `no-length`: the voice is not tuned by a length (a vessel);
 * - `not-this-voice`: the pitch heard is too far from the note to be this voice.
 */
export type VoicingErrorCode =
  'bad-note' | 'bad-number' | 'bad-kind' | 'out-of-range' | 'unreachable' | 'no-length' | 'not-this-voice';

/** A refusal of the voicing calculation; `message` is a sentence that names the input and the mend. */
export class VoicingError extends Error {
  readonly code: VoicingErrorCode;
  /** The name of the input at fault, as in the types (`boreMm`), where there is one. */
  readonly field: string | undefined;

  constructor(code: VoicingErrorCode, message: string, field?: string) {
    super(message);
    this.name = 'VoicingError';
    this.code = code;
    this.field = field;
  }
}
