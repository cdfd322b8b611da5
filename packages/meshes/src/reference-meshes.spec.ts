import { readFileSync, readdirSync } from 'node:fs';
import { zipSync } from 'fflate';
import { MeshError, measure, readMesh, type Measurement } from './index.js';

// Values: fixtures/reference/manifest.json, whose entries name their source (closed forms of faceted solids,
// and measurements by independent tools).
interface Numbers {
  readonly volume?: number;
  readonly area?: number;
  readonly triangles?: number;
  readonly open_edges?: number;
  readonly nonmanifold_edges?: number;
  readonly closed?: boolean;
}
interface Entry {
  readonly file: string;
  readonly expected: Readonly<Record<string, unknown>>;
  readonly reference?: {
    readonly volume_mm3: number;
    readonly area_mm2: number;
    readonly bbox: readonly [readonly number[], readonly number[]];
    readonly triangles: number;
    readonly watertight: boolean;
  };
  readonly measured: { readonly numpy_signed_tetra?: Numbers };
}

const folder = new URL('../fixtures/reference/', import.meta.url);
const { files } = JSON.parse(readFileSync(new URL('manifest.json', folder), 'utf8')) as {
  files: readonly Entry[];
};
const byName = new Map(files.map((entry) => [entry.file, entry]));
const MADE_HERE = 'bad_zip_many_entries.3mf';

function bytesOf(file: string): Uint8Array {
  return new Uint8Array(readFileSync(new URL(file, folder)));
}

function measureFile(file: string): Measurement {
  return measure(readMesh(bytesOf(file), { fileName: file }));
}

function refusalOf(file: string, bytes = bytesOf(file)): MeshError {
  try {
    readMesh(bytes, { fileName: file });
  } catch (error) {
    if (error instanceof MeshError) return error;
    throw error;
  }
  throw new Error(`${file} was read`);
}

function expectClose(actual: number, expected: number, relative = 1e-4): void {
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(relative * Math.abs(expected));
}

/** Files that a careful reader may refuse, and does here, with the reason. */
const REFUSED_BY_CHOICE: Readonly<Record<string, string>> = {
  '3mfc_MUSTFAIL_Chapter2.1.1a_PartsRelationships_NonExist3DModelPart.3mf': 'no-model',
  '3mfc_MUSTFAIL_Chapter2.1.2_PartsRelationships_MoreThanOne3DModelPart.3mf': 'ambiguous-model',
  '3mfc_MUSTFAIL_Chapter2.3.2a_NonUTF_Encoding.3mf': 'bad-encoding',
  '3mfc_MUSTFAIL_Chapter3.4.3.1a_NotMatchingObjectIdInBuildItem.3mf': 'unknown-object',
  '3mfc_MUSTFAIL_Chapter3.4a_MoreThanOneModel.3mf': 'bad-xml',
  '3mfc_MUSTFAIL_Chapter3.4b_MissingBuildElement.3mf': 'bad-model',
  '3mfc_MUSTFAIL_Chapter4a_InvalidObjectType.3mf': 'bad-model',
  '3mfc_beam_pyramid.3mf': 'unsupported-extension',
  'html_named.pdf': 'not-an-stl',
};
/** Errors that the manifest names for those that must not, or need not, be read. */
const refusals = files
  .filter(({ file, expected }) => {
    const isBroken = expected['accept'] === false || String(expected['accept']).startsWith('reject');
    return isBroken && file !== 'half_flipped.stl' && file !== MADE_HERE && !(file in REFUSED_BY_CHOICE);
  })
  .map(({ file, expected }) => [file, String(expected['error'])] as const);
const refusedNames = new Set([
  ...refusals.map(([file]) => file),
  ...Object.keys(REFUSED_BY_CHOICE),
  MADE_HERE,
]);
const readable = files.filter(({ file }) => !refusedNames.has(file));

describe('the reference meshes', () => {
  it('are all here, and each is either read or refused', () => {
    const present = new Set(readdirSync(folder));
    const absent = files.map(({ file }) => file).filter((file) => !present.has(file));
    expect(absent).toEqual([MADE_HERE]);
    expect(readable.length + refusedNames.size).toBe(files.length);
    expect(readable.length).toBeGreaterThan(70);
  });

  it.each(refusals)('refuse %s as %s, naming the file', (file, code) => {
    const error = refusalOf(file);
    expect(error.code).toBe(code);
    expect(error.message).toContain(`“${file}”`);
    expect(error.message.endsWith('.')).toBe(true);
  });

  it.each(Object.entries(REFUSED_BY_CHOICE))('refuse %s as %s', (file, code) => {
    expect(refusalOf(file).code).toBe(code);
  });

  it('refuse an archive of five thousand entries as its manifest says', () => {
    const entries = Object.fromEntries(
      Array.from({ length: 5003 }, (_, i) => [`Metadata/${i}.txt`, new Uint8Array()]),
    );
    expect(refusalOf(MADE_HERE, zipSync(entries)).code).toBe(byName.get(MADE_HERE)!.expected['error']);
  });

  it.each(
    readable.filter(({ reference }) => reference !== undefined).map((entry) => [entry.file, entry] as const),
  )('measure %s as its reference says', (file, { reference }) => {
    const measured = measureFile(file);
    expectClose(measured.volumeMm3, reference!.volume_mm3);
    expectClose(measured.areaMm2, reference!.area_mm2);
    expect(measured.triangles).toBe(reference!.triangles);
    expect(measured.watertight).toBe(reference!.watertight);
    const longest = Math.max(...measured.sizeMm);
    reference!.bbox.flat().forEach((coordinate, i) => {
      const actual = [...measured.minMm, ...measured.maxMm][i]!;
      expect(Math.abs(actual - coordinate)).toBeLessThanOrEqual(1e-4 * longest);
    });
  });

  it.each(
    readable
      .filter(({ measured }) => measured.numpy_signed_tetra?.closed !== undefined)
      .map((entry) => [entry.file, entry] as const),
  )(
    'count the edges of %s as an independent reader does',
    (file, { measured: { numpy_signed_tetra: numbers } }) => {
      const measured = measureFile(file);
      expect(measured.openEdges).toBe(numbers!.open_edges);
      expect(measured.nonManifoldEdges).toBe(numbers!.nonmanifold_edges);
      expect(measured.watertight).toBe(numbers!.closed);
      expectClose(measured.areaMm2, numbers!.area!, 1e-9);
    },
  );

  it.each(
    readable
      .filter(({ expected }) => typeof expected['volume_mm3'] === 'number')
      .map((entry) => [entry.file, entry] as const),
  )('measure %s as is expected of it', (file, { expected }) => {
    const measured = measureFile(file);
    expectClose(
      measured.volumeMm3,
      Number(expected['volume_mm3']),
      Number(expected['relative_tolerance'] ?? 1e-4),
    );
    if (expected['area_mm2'] !== undefined) expectClose(measured.areaMm2, Number(expected['area_mm2']));
    if (expected['triangles'] !== undefined) expect(measured.triangles).toBe(expected['triangles']);
    if (expected['bbox_mm'] !== undefined) {
      (expected['bbox_mm'] as number[]).forEach((size, axis) =>
        expectClose(measured.sizeMm[axis]!, size, 1e-9),
      );
    }
  });

  it.each([
    'solid_header_binary.stl',
    'trailing_bytes.stl',
    'degenerate_triangles.stl',
    'inverted_normals.stl',
    'half_flipped.stl',
  ])('measure the volume of %s like the tube it was made from', (file) => {
    expectClose(measureFile(file).volumeMm3, byName.get('tube_od24_id21_h60.stl')!.reference!.volume_mm3);
  });

  it('tell the faults of broken solids apart', () => {
    expect(measureFile('degenerate_triangles.stl')).toMatchObject({
      degenerateTriangles: 3,
      watertight: true,
    });
    expect(measureFile('inverted_normals.stl')).toMatchObject({
      windingFaults: 0,
      flippedTriangles: 512,
      watertight: true,
    });
    expect(measureFile('half_flipped.stl')).toMatchObject({
      windingFaults: 588,
      flippedTriangles: 256,
      watertight: false,
    });
    expect(measureFile('duplicate_triangle.stl')).toMatchObject({
      nonManifoldEdges: 3,
      shells: 1,
      watertight: false,
    });
    expect(measureFile('touching_edge_cubes.stl')).toMatchObject({
      nonManifoldEdges: 1,
      shells: 2,
      watertight: false,
    });
    expect(measureFile('nested_cavity_30.stl')).toMatchObject({
      shells: 2,
      flippedTriangles: 0,
      watertight: true,
    });
    expect(measureFile('overlapping_cubes.stl')).toMatchObject({ shells: 2, volumeMm3: 2000 });
    expect(measureFile('3mfc_core_dodeca_chain_loop.3mf').shells).toBe(40);
    expect(measureFile('3mfc_core_cube_gears.3mf').shells).toBe(17);
  });

  it('ask about the unit where a part is too small for millimetres', () => {
    const inches = measureFile('units_inches.stl').unitGuess;
    expect(inches).toMatchObject({ unit: 'inch', isSure: false });
    expect(inches.sentence).toContain('63.5 mm');
    expect(measureFile('units_metres.stl').unitGuess).toMatchObject({ unit: 'meter', isSure: false });
    expect(measureFile('reed_plate_44.stl').unitGuess).toMatchObject({ unit: 'millimeter', isSure: true });
    expect(measureFile('ok_unit_inch.3mf').unitGuess).toEqual({ unit: 'inch', isSure: true, sentence: null });
  });
});
