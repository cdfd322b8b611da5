import type { Comparison } from '@windchest/contracts';
import type { MeasuredMesh } from '../files/measured-mesh.js';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';
import { applyWaiver } from './apply-waiver.js';
import { changesMarked } from './change-gate.js';
import { notNeeded, open, passed, type GateFacts } from './gate-facts.js';
import { fitsBuildVolume, partsMeasured, watertight } from './mesh-gates.js';
import { licenceAndPrice } from './sale-gate.js';
import { voicesInTune } from './voice-gate.js';
import { assemblyNotes, cautions, changeNotes } from './word-gates.js';

const measured = (size: [number, number, number], over: Partial<MeasuredMesh> = {}): MeasuredMesh => ({
  format: 'stl-binary',
  triangles: 12,
  shells: 1,
  sizeMm: size,
  minMm: [0, 0, 0],
  maxMm: size,
  volumeMm3: 1000,
  areaMm2: 600,
  openEdges: 0,
  nonManifoldEdges: 0,
  degenerateTriangles: 0,
  windingFaults: 0,
  flippedTriangles: 0,
  watertight: true,
  unitGuess: { unit: 'millimeter', isSure: true, sentence: null },
  ...over,
});
const file = (over: Partial<FileOfRevision> = {}): FileOfRevision => ({
  id: 'f',
  sha256: 'a'.repeat(64),
  fileName: 'x.stl',
  bytes: 1,
  kind: 'stl',
  addedAt: new Date(0),
  measuring: 'measured',
  measured: measured([10, 10, 10]),
  geometryHash: 'g',
  drawings: null,
  previewSha256: null,
  fault: null,
  ...over,
});
const part = (over: Partial<PartOfRevision> = {}): PartOfRevision => ({
  id: 'p',
  revisionId: 'r',
  code: 'J-01',
  name: 'Tongue',
  quantity: 1,
  orientation: 'may-turn',
  printSpec: null,
  voice: null,
  mark: null,
  reason: '',
  isGauge: false,
  variants: [],
  file: file(),
  ...over,
});
const facts = (
  over: Partial<Omit<GateFacts, 'revision'>> & { revision?: Partial<GateFacts['revision']> } = {},
): GateFacts => ({
  parts: [part()],
  licences: [{ isOffered: true, terms: 'Print it.' }],
  changes: null,
  ...over,
  revision: {
    assemblyNotes: 'Glue it.',
    changeNotes: '',
    cautions: 'Hot.',
    buildVolume: { xMm: 200, yMm: 150, zMm: 100 },
    declaredCents: 20,
    room: { temperatureC: 20 },
    ...over.revision,
  },
});
const changed = (over: Partial<Comparison['rows'][number]>): Comparison['rows'][number] => ({
  code: 'J-01',
  name: 'Tongue',
  quantity: 1,
  difference: 'changed',
  whatDiffers: '',
  sizeChangeMm: null,
  volumeChangePercent: null,
  areaChangePercent: null,
  deviation: null,
  mark: null,
  reason: '',
  variants: [],
  ...over,
});

const box = { min: { x: 0, y: 0, z: 0 }, max: { x: 1, y: 1, z: 1 } };
const deviation = {
  state: 'compared' as const,
  largestMm: 0.4,
  placeMm: null,
  placeIsOn: null,
  movedMm: null,
  clearance: null,
  boxMm: box,
  earlierBoxMm: box,
  where: '',
};

describe('the gate', () => {
  it('parts-measured wants parts, each with a measured file', () => {
    expect(partsMeasured(facts())).toMatchObject({ state: 'passed', reason: '1 part measured.' });
    expect(partsMeasured(facts({ parts: [] })).state).toBe('open');
    const parts = [
      part({ file: null }),
      part({ code: 'J-02', file: file({ measuring: 'waiting', measured: null }) }),
      part({ code: 'J-03', file: file({ measuring: 'refused', measured: null, fault: '“y.stl” is cut.' }) }),
    ];
    expect(partsMeasured(facts({ parts }))).toMatchObject({
      state: 'open',
      reason: 'J-01 has no file. “y.stl” is cut. J-02 is being measured.',
    });
  });

  it('watertight names the leaks and may be waived', () => {
    expect(watertight(facts()).state).toBe('passed');
    const leaking = file({
      measured: measured([1, 1, 1], { watertight: false, openEdges: 3, windingFaults: 1 }),
    });
    expect(watertight(facts({ parts: [part({ file: leaking })] }))).toMatchObject({
      state: 'open',
      mayBeWaived: true,
      reason: 'Not watertight: J-01 (3 open edges, 1 edge with its sides turned).',
    });
    expect(watertight(facts({ parts: [part({ file: null })] })).state).toBe('open');
  });

  it('parts-measured, watertight and fits-build-volume look at every clearance of a part', () => {
    const inPlus = (over: Partial<FileOfRevision>) =>
      facts({ parts: [part({ variants: [{ clearance: 'plus', file: file(over) }] })] });
    expect(partsMeasured(inPlus({}))).toMatchObject({ state: 'passed', reason: '1 part measured.' });
    expect(partsMeasured(inPlus({ measuring: 'waiting', measured: null }))).toMatchObject({
      state: 'open',
      reason: 'J-01 + is being measured.',
    });
    const leaking = measured([1, 1, 1], { watertight: false, openEdges: 3 });
    expect(watertight(inPlus({ measured: leaking })).reason).toBe('Not watertight: J-01 + (3 open edges).');
    expect(watertight(inPlus({ measured: null })).state).toBe('open');
    expect(fitsBuildVolume(inPlus({ measured: measured([10, 10, 190]) })).reason).toContain(
      'J-01 + is 90.0 mm too tall',
    );
  });

  it.each([
    ['as-exported', [200, 150, 100], 'passed', ''],
    ['as-exported', [150, 200, 100], 'open', '50.0 mm too deep'],
    ['may-turn', [150, 200, 100], 'passed', ''],
    ['may-turn', [100, 100, 190], 'open', '90.0 mm too tall'],
    ['may-lie', [100, 100, 190], 'passed', ''],
    ['may-lie', [10, 10, 212.4], 'open', '12.4 mm too wide'],
    ['may-turn', [210, 160, 20], 'open', '10.0 mm too wide and 10.0 mm too deep'],
  ] as const)('fits-build-volume keeps the rule %s for %j', (orientation, size, state, reason) => {
    const one = part({
      orientation,
      file: file({ measured: measured([...size] as [number, number, number]) }),
    });
    const gate = fitsBuildVolume(facts({ parts: [one] }));
    expect(gate.state).toBe(state);
    expect(gate.reason).toContain(reason);
  });

  it('voices-in-tune predicts each voice in the revision’s room', () => {
    expect(voicesInTune(facts()).state).toBe('not-needed');
    // 440 Hz in a string: f = √(T/µ) / 2L, so T = (2 · 0.5 m · 440 Hz)² · 0.001 kg/m = 193.6 N.
    const string = { kind: 'string' as const, note: 'A4', lengthMm: 500, linearDensityGPerM: 1 };
    const tuned = part({ voice: { ...string, tensionN: 193.6 } });
    expect(voicesInTune(facts({ parts: [tuned] }))).toMatchObject({ state: 'passed' });
    // 3 % more tension is 1200 · log2(√1.03) = 25.6 cents sharp.
    const sharp = part({ voice: { ...string, tensionN: 193.6 * 1.03 } });
    expect(voicesInTune(facts({ parts: [sharp] }))).toMatchObject({
      state: 'open',
      reason: 'Not within ±20 cents at 20 °C: J-01 is 26 cents above A4.',
    });
    expect(voicesInTune(facts({ parts: [sharp], revision: { declaredCents: 26 } })).state).toBe('passed');
  });

  it('assembly-notes names part codes that do not exist', () => {
    expect(assemblyNotes(facts({ revision: { assemblyNotes: ' \n' } })).state).toBe('open');
    expect(assemblyNotes(facts({ revision: { assemblyNotes: 'Push [[J-01]].' } })).state).toBe('passed');
    expect(
      assemblyNotes(facts({ revision: { assemblyNotes: '[[J-01]] [[X-9]] [[H-03]] [[X-9]]' } })),
    ).toMatchObject({
      state: 'open',
      reason: 'The notes name parts that this revision does not have: X-9, H-03.',
    });
  });

  it('change-notes are needed from the second revision on, under the known headings', () => {
    const notes = (changeNotes_: string) =>
      changeNotes(facts({ changes: [], revision: { changeNotes: changeNotes_ } }));
    expect(changeNotes(facts()).state).toBe('not-needed');
    expect(notes('').state).toBe('open');
    expect(notes('The foot is thicker.').reason).toContain('### Fixed');
    expect(notes('### Fixed\n\n### Added\n- x').reason).toContain('“Fixed”');
    expect(notes('### Fixed\n- The tongue locks.').state).toBe('passed');
    expect(notes('## Changed\r\n- The foot.\r\n').state).toBe('passed');
  });

  it('changes-marked wants a mark and a reason on every changed part', () => {
    const gate = (...rows: Comparison['rows']) => changesMarked(facts({ changes: rows }));
    expect(changesMarked(facts()).state).toBe('not-needed');
    expect(gate(changed({})).reason).toContain('J-01');
    expect(gate(changed({ mark: 'reprint needed' })).reason).toContain('reason for J-01');
    expect(gate(changed({ mark: 'reprint needed', reason: 'Cracks.' })).state).toBe('passed');
    expect(gate(changed({ difference: 're-exported' }), changed({ difference: 'new' })).state).toBe('passed');
  });

  it('changes-marked waits for the comparing before it asks for marks', () => {
    const waiting = { ...deviation, state: 'waiting' as const };
    const marked = { mark: 'reprint needed' as const, reason: 'Cracks.' };
    expect(changesMarked(facts({ changes: [changed({ ...marked, deviation: waiting })] }))).toMatchObject({
      state: 'open',
      mayBeWaived: false,
      reason: 'J-01 is being compared with the last revision.',
    });
    const failed = changed({ ...marked, deviation: { ...deviation, state: 'failed' } });
    expect(changesMarked(facts({ changes: [failed] })).state).toBe('passed');
  });

  it('cautions and licence-and-price want words and an offer', () => {
    expect(cautions(facts()).state).toBe('passed');
    expect(cautions(facts({ revision: { cautions: '' } })).state).toBe('open');
    expect(licenceAndPrice(facts()).state).toBe('passed');
    expect(licenceAndPrice(facts({ licences: [{ isOffered: false, terms: 'x' }] })).state).toBe('open');
  });
});

describe('a waiver', () => {
  const waiver = {
    reason: 'The slicer closes it.',
    waivedAgainst: 'Not watertight: J-01 (3 open edges).',
    waivedByName: 'Wren',
    waivedAt: new Date(0),
  };
  const stateOf = (gate: Parameters<typeof applyWaiver>[0], isReleased = false) =>
    applyWaiver(gate, waiver, isReleased).state;

  it('lets the fault pass that it was written against, and no other', () => {
    expect(applyWaiver(open('watertight', waiver.waivedAgainst), waiver, false)).toMatchObject({
      state: 'waived',
      reason: waiver.waivedAgainst,
      waiver: { by: 'Wren', at: '1970-01-01T00:00:00.000Z', reason: 'The slicer closes it.' },
    });
    expect(stateOf(open('watertight', 'Not watertight: J-02 (1 open edge).'))).toBe('open');
  });

  it('is shown, but counts for nothing, where the gate passes without it', () => {
    expect(applyWaiver(passed('watertight', ''), waiver, false)).toMatchObject({
      state: 'passed',
      waiver: { by: 'Wren' },
    });
    expect(stateOf(notNeeded('voices-in-tune', ''))).toBe('not-needed');
  });

  it('opens no gate that may not be waived', () => {
    expect(stateOf(open('cautions', waiver.waivedAgainst))).toBe('open');
    expect(stateOf({ ...open('watertight', waiver.waivedAgainst), mayBeWaived: false })).toBe('open');
  });

  it('stays with what was released, however the check words it later', () => {
    expect(stateOf(open('watertight', 'Leaks: J-01.'), true)).toBe('waived');
  });
});
