import { lengthForMm, midiToNote, noteLabel } from '@windchest/voicing';
import type { PlannedPart } from '../demo-types.js';
import { curlewBlock, endTongue, lockingTongue, pipesPerBlock } from '../shapes/curlew-block.js';
import { tongueGauge } from '../shapes/curlew-gauge.js';
import { curlewPipe, curlewSizes, tuningPlug } from '../shapes/curlew-pipe.js';
import { lipRail } from '../shapes/curlew-rail.js';
import {
  curlewCautions,
  curlewDescription,
  curlewFirstChanges,
  curlewGaugeNotes,
  curlewHardware,
  curlewNotes,
  curlewSecondChanges,
  curlewTagline,
} from './curlew-words.js';
import { classroomLicence, personalLicence, smallRunLicence } from './licences.js';
import { planKit, plannedPart, withLength, workshopBuildVolume, workshopRoom } from './plan-kit.js';
import { printSpec } from './print-spec.js';

const lowestMidi = 72;
const pipeCount = 18;

const pipes = Array.from({ length: pipeCount }, (_, index) => {
  const midi = lowestMidi + index;
  const note = midiToNote(midi);
  const unfitted = {
    kind: 'stopped-pipe' as const,
    note,
    lengthMm: 1,
    boreMm: curlewSizes.boreMm,
    wallMm: curlewSizes.wallMm,
  };
  const voice = withLength(unfitted, lengthForMm(unfitted, note, workshopRoom));
  return plannedPart(
    { code: `P-${midi}`, name: `Pipe ${noteLabel(note)}`, orientation: 'may-turn', voice },
    () => curlewPipe(voice.lengthMm),
  );
});

const blocks = [
  { name: 'Pipe block, low', heightMm: 30 },
  { name: 'Pipe block, middle', heightMm: 26 },
  { name: 'Pipe block, high', heightMm: 22 },
].map(({ name, heightMm }, index) =>
  plannedPart({ code: `B-0${index + 1}`, name, orientation: 'may-turn', fileFormat: '3mf' }, () =>
    curlewBlock(heightMm, index + 1),
  ),
);

/** What one clearance of the locking tongue has more or less of a gap than the next, on each cheek. */
const clearanceStepMm = 0.1;

const tongues = (cheekGapMm: number, hasClearances: boolean) => [
  plannedPart(
    { code: 'J-01', name: 'Locking tongue', quantity: 2, orientation: 'may-turn' },
    () => lockingTongue(cheekGapMm),
    hasClearances
      ? {
          minus: () => lockingTongue(cheekGapMm - clearanceStepMm),
          plus: () => lockingTongue(cheekGapMm + clearanceStepMm),
        }
      : {},
  ),
  plannedPart({ code: 'J-02', name: 'End tongue', quantity: 2, orientation: 'may-lie' }, endTongue),
];

const rail = (heightMm: number) =>
  plannedPart(
    { code: 'R-01', name: 'Lip rail', quantity: pipeCount / pipesPerBlock, orientation: 'may-turn' },
    () => lipRail(heightMm),
  );

const plugs = [
  { name: 'Tuning plug, thin', thicknessMm: 0.8 },
  { name: 'Tuning plug, middle', thicknessMm: 1.6 },
  { name: 'Tuning plug, thick', thicknessMm: 2.4 },
].map(({ name, thicknessMm }, index) =>
  plannedPart({ code: `S-0${index + 1}`, name, quantity: 6, orientation: 'may-turn' }, () =>
    tuningPlug(thicknessMm),
  ),
);

const gauge = (cheekGapMm: number) =>
  plannedPart({ code: 'G-01', name: 'Tongue gauge', orientation: 'may-turn', isGauge: true }, () =>
    tongueGauge([cheekGapMm - clearanceStepMm, cheekGapMm, cheekGapMm + clearanceStepMm]),
  );

interface Drawn {
  cheekGapMm: number;
  railMm: number;
  hasClearances: boolean;
}

const parts = ({ cheekGapMm, railMm, hasClearances }: Drawn): PlannedPart[] => [
  ...pipes,
  ...blocks,
  ...tongues(cheekGapMm, hasClearances),
  rail(railMm),
  ...plugs,
  ...(hasClearances ? [gauge(cheekGapMm)] : []),
];

const common = {
  cautions: curlewCautions,
  printSpec: printSpec(
    'PETG',
    'Seam to the back of the pipes, away from the lips. Slow the outer wall to 30 mm/s.',
  ),
  hardware: curlewHardware,
  buildVolume: workshopBuildVolume,
  declaredCents: 5,
  room: workshopRoom,
};

export const curlew = planKit(
  {
    slug: 'curlew',
    name: 'Curlew',
    tagline: curlewTagline,
    description: curlewDescription,
    colour: 'orange',
    licences: [personalLicence(2400), smallRunLicence(9600, 50), classroomLicence(6000)],
  },
  [
    {
      ...common,
      mark: 1,
      issue: 0,
      assemblyNotes: curlewNotes(''),
      changeNotes: curlewFirstChanges,
      planned: parts({ cheekGapMm: 0.1, railMm: 7.5, hasClearances: false }),
      marks: [],
    },
    {
      ...common,
      mark: 1,
      issue: 1,
      assemblyNotes: curlewNotes(curlewGaugeNotes),
      changeNotes: curlewSecondChanges,
      planned: parts({ cheekGapMm: 0.22, railMm: 9, hasClearances: true }),
      marks: [
        {
          code: 'J-01',
          mark: 'reprint needed',
          reason: 'Too tight in PETG on most printers; forcing it can split the block.',
        },
        {
          code: 'R-01',
          mark: 'reprint if it troubles you',
          reason: 'With the low rail the top octave hisses for some players.',
        },
      ],
    },
  ],
);
