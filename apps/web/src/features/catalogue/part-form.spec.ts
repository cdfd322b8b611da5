import { partBody, type Part, type PrintSpecification } from '@windchest/contracts';
import { partBodyOf, partForm } from './part-form.js';

const spec: PrintSpecification = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 3,
  topLayers: 5,
  bottomLayers: 4,
  infill: 0.15,
  material: 'PETG',
  supports: 'none',
  remarks: '',
};
const part = (changes: Partial<Part> = {}): Part => ({
  id: 'x',
  code: 'P-72',
  name: 'Pipe C5',
  quantity: 1,
  orientation: 'may-turn',
  printSpec: null,
  voice: null,
  isGauge: false,
  file: null,
  drawings: null,
  previewBytes: null,
  previewSha256: null,
  variants: [],
  ...changes,
});
const voices: NonNullable<Part['voice']>[] = [
  { kind: 'stopped-pipe', note: 'C5', lengthMm: 158.5, boreMm: 11, wallMm: 1.6 },
  { kind: 'open-pipe', note: 'C5', lengthMm: 320, boreMm: 14, mouthCorrectionMm: 8 },
  { kind: 'free-bar', note: 'A4', lengthMm: 140, thicknessMm: 4, youngsModulusGPa: 2.3, densityKgM3: 1240 },
  { kind: 'string', note: 'E4', lengthMm: 330, tensionN: 60, linearDensityGPerM: 0.4 },
  {
    kind: 'vessel',
    note: 'C5',
    volumeCm3: 90,
    holes: [{ diameterMm: 6 }, { diameterMm: 7.5 }],
    wallMm: 3,
  },
];

describe('the form of a part', () => {
  it.each(voices)('gives back a $kind as it was', (voice) => {
    const whole = part({ voice, isGauge: true, printSpec: { ...spec, infill: 0.07 } });
    const body = partBody.parse(partBodyOf(partForm(whole, spec)));
    expect(body).toEqual({
      code: 'P-72',
      name: 'Pipe C5',
      quantity: 1,
      isGauge: true,
      orientation: 'may-turn',
      voice,
      printSpec: { ...spec, infill: 0.07 },
    });
  });

  it('sends neither voice nor settings where the part has none', () => {
    const body = partBody.parse(partBodyOf(partForm(part(), spec)));
    expect(body).toMatchObject({ voice: null, printSpec: null });
  });

  it('names the measure that is missing by the name of its field', () => {
    const form = partForm(part({ voice: voices[0] }), spec);
    const { error } = partBody.safeParse(partBodyOf({ ...form, voice: { ...form.voice, boreMm: NaN } }));
    expect(error?.issues.map((issue) => issue.path.join('.'))).toEqual(['voice.boreMm']);
  });

  it('leaves the measures of another kind of voice out', () => {
    const form = partForm(part({ voice: voices[0] }), spec);
    const body = partBody.safeParse(
      partBodyOf({
        ...form,
        voice: { ...form.voice, kind: 'string', tensionN: 40, linearDensityGPerM: 0.5 },
      }),
    );
    expect(body.data?.voice).toEqual({
      kind: 'string',
      note: 'C5',
      lengthMm: 158.5,
      tensionN: 40,
      linearDensityGPerM: 0.5,
    });
  });
});
