import type { Part, PrintSpecification, VoiceWithNote } from '@windchest/contracts';
import { type PrintSpecForm, printSpecBody, printSpecForm } from './print-spec-form.js';

export type VoiceKind = VoiceWithNote['kind'];
export const voiceKinds = [
  'stopped-pipe',
  'open-pipe',
  'free-bar',
  'tine',
  'string',
  'vessel',
] as const satisfies readonly VoiceKind[];

const pipe = [
  { name: 'lengthMm' },
  { name: 'boreMm' },
  { name: 'wallMm', isOptional: true },
  { name: 'mouthCorrectionMm', isOptional: true },
] as const;
const bar = [
  { name: 'lengthMm' },
  { name: 'thicknessMm' },
  { name: 'widthMm', isOptional: true },
  { name: 'youngsModulusGPa' },
  { name: 'densityKgM3' },
] as const;

/** The measures each kind of voice has. A vessel's holes are a list and stand apart. */
export const voiceMeasures = {
  'stopped-pipe': pipe,
  'open-pipe': pipe,
  'free-bar': bar,
  tine: bar,
  string: [{ name: 'lengthMm' }, { name: 'tensionN' }, { name: 'linearDensityGPerM' }],
  vessel: [{ name: 'volumeCm3' }, { name: 'wallMm' }],
} as const satisfies Record<VoiceKind, readonly { name: string; isOptional?: boolean }[]>;

export type VoiceMeasure = (typeof voiceMeasures)[VoiceKind][number]['name'];
export type VoiceForm = { kind: VoiceKind; note: string; holes: string } & Record<VoiceMeasure, number>;

export interface PartForm {
  code: string;
  name: string;
  quantity: number;
  orientation: Part['orientation'];
  isGauge: boolean;
  isSounding: boolean;
  voice: VoiceForm;
  hasOwnSpec: boolean;
  printSpec: PrintSpecForm;
}

const noMeasures: Record<VoiceMeasure, number> = {
  lengthMm: NaN,
  boreMm: NaN,
  wallMm: NaN,
  mouthCorrectionMm: NaN,
  thicknessMm: NaN,
  widthMm: NaN,
  youngsModulusGPa: NaN,
  densityKgM3: NaN,
  tensionN: NaN,
  linearDensityGPerM: NaN,
  volumeCm3: NaN,
};

const voiceForm = (voice: VoiceWithNote | null): VoiceForm => ({
  kind: 'stopped-pipe',
  note: '',
  ...noMeasures,
  ...voice,
  holes: voice?.kind === 'vessel' ? voice.holes.map((hole) => hole.diameterMm).join(', ') : '',
});

/** A part as it stands in its form; settings of its own start from those of the revision. */
export const partForm = (part: Part, revisionSpec: PrintSpecification): PartForm => ({
  code: part.code,
  name: part.name,
  quantity: part.quantity,
  orientation: part.orientation,
  isGauge: part.isGauge,
  isSounding: part.voice !== null,
  voice: voiceForm(part.voice),
  hasOwnSpec: part.printSpec !== null,
  printSpec: printSpecForm(part.printSpec ?? revisionSpec),
});

const holesOf = (text: string) =>
  text
    .split(/[,;\s]+/)
    .filter((one) => one !== '')
    .map((one) => ({ diameterMm: Number(one) }));

function voiceBody(voice: VoiceForm): unknown {
  const measures = voiceMeasures[voice.kind] as readonly { name: VoiceMeasure; isOptional?: boolean }[];
  return {
    kind: voice.kind,
    note: voice.note.trim(),
    ...Object.fromEntries(
      measures
        .filter(({ name, isOptional }) => !(isOptional && Number.isNaN(voice[name])))
        .map(({ name }) => [name, voice[name]]),
    ),
    ...(voice.kind === 'vessel' && { holes: holesOf(voice.holes) }),
  };
}

/** What the form says, in the shape the contract checks. */
export const partBodyOf = (form: PartForm): unknown => ({
  code: form.code,
  name: form.name,
  quantity: form.quantity,
  orientation: form.orientation,
  isGauge: form.isGauge,
  voice: form.isSounding ? voiceBody(form.voice) : null,
  printSpec: form.hasOwnSpec ? printSpecBody(form.printSpec) : null,
});
