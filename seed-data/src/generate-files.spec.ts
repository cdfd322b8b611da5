import { createHash } from 'node:crypto';
import { measure, type Measurement, readMesh } from '@windchest/meshes';
import { noteToHz } from '@windchest/voicing';
import { demoWorkshop } from './demo-workshop.js';
import type { DemoPart, DemoRevision } from './demo-types.js';
import { generateFiles } from './generate-files.js';
import { curlewSizes, pipeProfile } from './shapes/curlew-pipe.js';
import { dunlinSizes } from './shapes/dunlin-vessel.js';
import { godwitSizes } from './shapes/godwit-parts.js';
import { tealSizes } from './shapes/teal-bars.js';
import { bodyStressMPa } from './shapes/turnstone-body.js';
import { crownYMm, nutYMm, turnstoneSizes } from './shapes/turnstone-sizes.js';
import { totalTensionN, turnstoneStrings, wireLoad } from './kits/turnstone-strings.js';

interface Drawn {
  part: DemoPart;
  bytes: Uint8Array;
  measured: Measurement;
}

/** A part's own file by its code, others by its code and their clearance: `J-01 plus`. */
const namesOf = (part: DemoPart) => [
  { key: part.code, fileName: part.fileName },
  ...part.variants.map(({ clearance, fileName }) => ({ key: `${part.code} ${clearance}`, fileName })),
];

const known = new Map<string, Map<string, Drawn>>();

/** Drawing and measuring takes a while: once for each revision. */
function drawn(slug: string, label: string): Map<string, Drawn> {
  const drawing = known.get(`${slug} ${label}`) ?? drawAndMeasure(slug, label);
  known.set(`${slug} ${label}`, drawing);
  return drawing;
}

function drawAndMeasure(slug: string, label: string): Map<string, Drawn> {
  const revision = revisionOf(slug, label);
  const files = generateFiles({ slug }, revision);
  const named = revision.parts.flatMap((part) => namesOf(part).map((name) => ({ ...name, part })));
  return new Map(
    named.map(({ key, fileName, part }, index) => {
      const file = files[index];
      if (file?.fileName !== fileName) throw new Error(`${key} has no file.`);
      return [key, { part, bytes: file.bytes, measured: measure(readMesh(file.bytes, file)) }];
    }),
  );
}

function revisionOf(slug: string, label: string): DemoRevision {
  const revision = demoWorkshop.kits
    .find((kit) => kit.slug === slug)
    ?.revisions.find((one) => one.label === label);
  if (!revision) throw new Error(`no ${slug} ${label}`);
  return revision;
}

function only<T>(value: T | undefined): T {
  if (value === undefined) throw new Error('missing');
  return value;
}

const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const lengthOf = ({ part }: Drawn) => {
  if (!part.voice || !('lengthMm' in part.voice)) throw new Error(`${part.code} has no length.`);
  return part.voice.lengthMm;
};

describe.each(demoWorkshop.kits.flatMap((kit) => kit.revisions.map((one) => [kit.slug, one.label] as const)))(
  'the files of %s %s',
  (slug, label) => {
    const all = drawn(slug, label);

    it.each([...all.keys()])(
      '%s is one closed solid, wound outwards, that stands on the bed and fits it',
      (code) => {
        const { measured, part } = only(all.get(code));
        expect(measured).toMatchObject({
          watertight: true,
          shells: 1,
          openEdges: 0,
          nonManifoldEdges: 0,
          degenerateTriangles: 0,
          windingFaults: 0,
          format: part.fileFormat === '3mf' ? '3mf' : 'stl-binary',
        });
        expect(measured.volumeMm3).toBeGreaterThan(0);
        expect(measured.minMm[2]).toBe(0);
        expect(measured.sizeMm[0]).toBeLessThanOrEqual(220);
        expect(measured.sizeMm[1]).toBeLessThanOrEqual(220);
        expect(measured.sizeMm[2]).toBeLessThanOrEqual(250);
      },
    );

    it('come out as the same bytes again', () => {
      const again = generateFiles({ slug }, { label });
      expect(again.map(({ bytes }) => sha256(bytes))).toEqual(
        [...all.values()].map(({ bytes }) => sha256(bytes)),
      );
    });

    it('are all different', () => {
      expect(new Set([...all.values()].map(({ bytes }) => sha256(bytes))).size).toBe(all.size);
    });
  },
);

describe('Curlew', () => {
  const all = drawn('curlew', 'Mk 1.0');
  const pipes = [...all.values()].filter(({ part }) => part.voice);

  it('has a floor and then the length of its voice in every pipe', () => {
    expect(pipes).toHaveLength(18);
    for (const pipe of pipes) {
      expect(pipe.measured.sizeMm[2]).toBeCloseTo(lengthOf(pipe) + curlewSizes.floorMm, 4);
    }
  });

  it('has pipes of the volume that their profile encloses', () => {
    // A regular n-gon has the area n/2 · sin(2π/n) · r²; between two of them lies a frustum (textbook formulas).
    const { segments, boreMm } = curlewSizes;
    const polygon = (segments / 2) * Math.sin((2 * Math.PI) / segments);
    for (const pipe of pipes) {
      const profile = pipeProfile(lengthOf(pipe));
      let outside = 0;
      for (let i = 0; i + 1 < profile.length; i++) {
        const [a, b] = [only(profile[i]), only(profile[i + 1])];
        const radii = a.radiusMm ** 2 + a.radiusMm * b.radiusMm + b.radiusMm ** 2;
        outside += (polygon * (b.zMm - a.zMm) * radii) / 3;
      }
      const bore = polygon * (boreMm / 2) ** 2 * lengthOf(pipe);
      expect(pipe.measured.volumeMm3 / (outside - bore)).toBeCloseTo(1, 4);
    }
  });

  it('differs between its revisions in the locking tongue and the lip rail, and adds clearances with a gauge', () => {
    const second = drawn('curlew', 'Mk 1.1');
    const changed = [...all.keys()].filter(
      (code) => sha256(only(all.get(code)).bytes) !== sha256(only(second.get(code)).bytes),
    );
    expect([...second.keys()].filter((key) => !all.has(key))).toEqual(['J-01 minus', 'J-01 plus', 'G-01']);
    expect([...all.keys()].filter((key) => !second.has(key))).toEqual([]);
    expect(changed).toEqual(['J-01', 'R-01']);
    expect(revisionOf('curlew', 'Mk 1.1').marks.map(({ code }) => code)).toEqual(changed);
    const change = (code: string, axis: 0 | 1 | 2) =>
      only(second.get(code)).measured.sizeMm[axis] - only(all.get(code)).measured.sizeMm[axis];
    expect(change('J-01', 1)).toBeCloseTo(-0.24, 4);
    expect(change('J-01', 0)).toBe(0);
    expect(change('R-01', 2)).toBeCloseTo(1.5, 4);
  });

  it('has tongues whose gap grows from − to +, and on the gauge the same three', () => {
    const second = drawn('curlew', 'Mk 1.1');
    const widthOf = (key: string) => only(second.get(key)).measured.sizeMm[1];
    // A cheek on either side: twice the step.
    expect(widthOf('J-01 minus') - widthOf('J-01')).toBeCloseTo(0.2, 4);
    expect(widthOf('J-01') - widthOf('J-01 plus')).toBeCloseTo(0.2, 4);
    const { bytes, part } = only(second.get('G-01'));
    expect(part.isGauge).toBe(true);
    // At half its height the gauge ends in a lug on three sides, as wide there as a tongue.
    const { corners: numbers } = readMesh(bytes, { fileName: part.fileName });
    const corners = Array.from({ length: numbers.length / 3 }, (_, at) => [
      numbers[3 * at] ?? 0,
      numbers[3 * at + 1] ?? 0,
    ]);
    const widest = (axis: 0 | 1, sign: 1 | -1) => {
      const far = Math.max(...corners.map((corner) => sign * (corner[axis] ?? 0)));
      const end = corners.filter((corner) => sign * (corner[axis] ?? 0) > far - 0.001);
      return 2 * Math.max(...end.map((corner) => corner[axis === 0 ? 1 : 0] ?? 0));
    };
    expect(widest(0, 1)).toBeCloseTo(widthOf('J-01 minus'), 3);
    expect(widest(1, 1)).toBeCloseTo(widthOf('J-01'), 3);
    expect(widest(0, -1)).toBeCloseTo(widthOf('J-01 plus'), 3);
  });
});

describe('Teal', () => {
  it('has bars of the length and thickness of their voices', () => {
    const bars = [...drawn('teal', 'Mk 1.0').values()].filter(({ part }) => part.voice);
    expect(bars).toHaveLength(8);
    for (const bar of bars) {
      expect(bar.measured.sizeMm[0]).toBeCloseTo(lengthOf(bar), 4);
      expect(bar.measured.sizeMm[2]).toBeCloseTo(tealSizes.barThicknessMm, 5);
    }
  });
});

describe('Dunlin', () => {
  it('has vessels that leave out the volume of their voices', () => {
    for (const { part, measured } of drawn('dunlin', 'Mk 1.0').values()) {
      if (part.voice?.kind !== 'vessel') continue;
      const { widthMm, depthMm, beakDepthMm, beakMm, windowWidthMm, windowHeightMm, frontWallMm } =
        dunlinSizes;
      const bodyMm = measured.sizeMm[2] - beakMm;
      // Bevels of 1 mm run up the corners: two in front over the whole height, two behind up to the beak.
      const blockMm3 = (widthMm * depthMm - 2) * bodyMm + (widthMm * beakDepthMm - 1) * beakMm;
      const windwayMm3 = windowWidthMm * 1.2 * (dunlinSizes.blockMm + beakMm);
      const windowMm3 = windowWidthMm * windowHeightMm * frontWallMm;
      // The ramp: twelve terraces of 0.4 mm, 0.2, 0.4 … 2.4 mm deep.
      const rampMm3 = windowWidthMm * 0.4 * 0.2 * ((12 * 13) / 2);
      const chamberMm3 = blockMm3 - windwayMm3 - windowMm3 - rampMm3 - measured.volumeMm3;
      expect(chamberMm3 / 1000).toBeCloseTo(part.voice.volumeCm3, 3);
    }
  });
});

describe('Godwit', () => {
  it('has tines as long as their voices beyond the clamped tail', () => {
    const tines = [...drawn('godwit', 'Mk 1.0').values()].filter(({ part }) => part.voice);
    expect(tines).toHaveLength(8);
    for (const tine of tines) {
      expect(tine.measured.sizeMm[0]).toBeCloseTo(lengthOf(tine) + godwitSizes.tailMm, 4);
      expect(tine.measured.sizeMm[2]).toBeCloseTo(godwitSizes.tineThicknessMm, 5);
    }
  });
});

describe('Turnstone', () => {
  const all = drawn('turnstone', 'Mk 1.0');

  it('has a body whose saddles and nut are as far apart as the strings are long', () => {
    expect(turnstoneStrings).toHaveLength(10);
    turnstoneStrings.forEach(({ voice }, index) => {
      expect(nutYMm - crownYMm(index)).toBeCloseTo(voice.lengthMm, 6);
    });
    expect(only(all.get('F-01')).measured.sizeMm[1]).toBeCloseTo(nutYMm + turnstoneSizes.aboveNutMm, 3);
  });

  it('has steel wires drawn to their notes, far from breaking', () => {
    for (const { voice, diameterMm } of turnstoneStrings) {
      // f = 1/(2L) · √(T/µ), µ = ρπd²/4 with 7850 kg/m³ (Mersenne's law; textbook).
      const massKgM = (7850 * Math.PI * (diameterMm / 1000) ** 2) / 4;
      const hz = Math.sqrt(voice.tensionN / massKgM) / (2 * (voice.lengthMm / 1000));
      expect(Math.abs(1200 * Math.log2(hz / noteToHz(voice.note)))).toBeLessThan(1);
    }
    expect(totalTensionN).toBeGreaterThan(100);
    expect(totalTensionN).toBeLessThan(150);
    expect(wireLoad).toBeLessThan(0.15);
  });

  it('says the tension of all strings, and a stress in the body that beam theory confirms', () => {
    const kit = demoWorkshop.kits.find((one) => one.slug === 'turnstone');
    expect(kit?.description).toContain(`all ten together with ${Math.round(totalTensionN)} N`);
    // By hand, in mm and N: walls 2 · 10 × 22, floor 130 × 2.4; A = 752, middle at 6.94, I = 35 424;
    // 128.8 N at 31 mm: 128.8 / 752 + 128.8 · 24.06 · 15.06 / 35 424 = 1.49.
    expect(bodyStressMPa(128.8, 9)).toBeCloseTo(1.49, 2);
  });

  it('has saddles one layer lower from string to string', () => {
    const heights = [...all.values()]
      .filter(({ part }) => part.voice)
      .map(({ measured }) => measured.sizeMm[2]);
    heights.slice(1).forEach((height, index) => expect((heights[index] ?? 0) - height).toBeCloseTo(0.2, 4));
  });
});

describe('generateFiles', () => {
  it('names the revision that does not exist', () => {
    expect(() => generateFiles({ slug: 'teal' }, { label: 'Mk 9.9' })).toThrow(
      'The demo workshop has no teal Mk 9.9.',
    );
  });
});
