import { strToU8, zipSync, type Zippable } from 'fflate';
import { boxCorners } from '../fixtures/solids.js';
import { MeshError, measure, readMesh } from './index.js';

const CORE = 'http://schemas.microsoft.com/3dmanufacturing/core/2015/02';
const PRODUCTION = 'http://schemas.microsoft.com/3dmanufacturing/production/2015/06';
const RELATIONSHIPS = `<?xml version="1.0" encoding="UTF-8"?><Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Target="/3D/part.model" Id="r" Type="http://schemas.microsoft.com/3dmanufacturing/2013/01/3dmodel"/></Relationships>`;

/** A box of 2 × 3 × 4 as a 3MF object: 24 in volume. */
function boxObject(id: number): string {
  const corners = boxCorners([2, 3, 4]);
  const vertices: string[] = [];
  const triangles: string[] = [];
  for (let i = 0; i < corners.length; i += 3) {
    vertices.push(`<vertex x="${corners[i]}" y="${corners[i + 1]}" z="${corners[i + 2]}"/>`);
    if (i % 9 === 0) triangles.push(`<triangle v1="${i / 3}" v2="${i / 3 + 1}" v3="${i / 3 + 2}"/>`);
  }
  return `<object id="${id}"><mesh><vertices>${vertices.join('')}</vertices><triangles>${triangles.join('')}</triangles></mesh></object>`;
}

function model(resources: string, build: string, attributes = ''): string {
  return `<?xml version="1.0" encoding="UTF-8"?><model xmlns="${CORE}" ${attributes}><resources>${resources}</resources><build>${build}</build></model>`;
}

function archive(text: string, more: Zippable = {}): Uint8Array {
  return zipSync({ '_rels/.rels': strToU8(RELATIONSHIPS), '3D/part.model': strToU8(text), ...more });
}

function measured(text: string, more: Zippable = {}) {
  return measure(readMesh(archive(text, more), { fileName: 'part.3mf' }));
}

function codeOf(bytes: Uint8Array): string {
  try {
    readMesh(bytes, { fileName: 'part.3mf' });
  } catch (error) {
    if (error instanceof MeshError) return error.code;
    throw error;
  }
  return 'read';
}

const plain = model(boxObject(1), '<item objectid="1"/>');

describe('a 3MF file', () => {
  it('is read whatever its name says', () => {
    expect(readMesh(archive(plain), { fileName: 'part.stl' }).format).toBe('3mf');
  });

  it.each([
    ['micron', 0.001],
    ['millimeter', 1],
    ['centimeter', 10],
    ['inch', 25.4],
    ['foot', 304.8],
    ['meter', 1000],
  ])('is measured in mm when drawn in %s', (unit, unitMm) => {
    const { volumeMm3 } = measured(model(boxObject(1), '<item objectid="1"/>', `unit="${unit}"`));
    expect(volumeMm3 / (24 * unitMm ** 3)).toBeCloseTo(1, 9);
  });

  it('refuses a unit that the format does not know', () => {
    expect(codeOf(archive(model(boxObject(1), '<item objectid="1"/>', 'unit="furlong"')))).toBe('bad-model');
  });

  it('applies the transform of a component before that of its item', () => {
    const assembly =
      '<object id="2"><components><component objectid="1" transform="1 0 0 0 1 0 0 0 1 10 0 0"/></components></object>';
    const { minMm, maxMm } = measured(
      model(boxObject(1) + assembly, '<item objectid="2" transform="0 1 0 -1 0 0 0 0 1 0 0 5"/>'),
    );
    // A quarter turn about z takes (x, y) to (−y, x).
    expect(minMm).toEqual([-3, 10, 5]);
    expect(maxMm).toEqual([0, 12, 9]);
  });

  it('keeps the outside outside when an item is mirrored', () => {
    const result = measured(model(boxObject(1), '<item objectid="1" transform="-1 0 0 0 1 0 0 0 1 0 0 0"/>'));
    expect(result).toMatchObject({ flippedTriangles: 0, watertight: true });
    expect(result.volumeMm3).toBeCloseTo(24, 9);
  });

  it('may keep its objects in further model parts', () => {
    const root = model(
      '',
      '<item objectid="7" p:path="/3D/Objects/box.model"/>',
      `xmlns:p="${PRODUCTION}" requiredextensions="p"`,
    );
    const more = { '3D/Objects/box.model': strToU8(model(boxObject(7), '')) };
    expect(measured(root, more).volumeMm3).toBeCloseTo(24, 9);
    expect(codeOf(archive(root))).toBe('no-model');
  });

  it('passes over elements of other name spaces, and reads prefixed ones of its own', () => {
    const foreign = model(
      boxObject(1),
      '<item objectid="1"/><x:item objectid="1"/>',
      'xmlns:x="https://example.org/x"',
    );
    expect(measured(foreign).triangles).toBe(12);
    const prefixed = plain.replace(/<(\/?)(?=[a-z])/g, '<$1c:').replace('xmlns=', 'xmlns:c=');
    expect(measured(prefixed).volumeMm3).toBeCloseTo(24, 9);
  });

  it.each([
    ['an object that is not there', model(boxObject(1), '<item objectid="9"/>'), 'unknown-object'],
    [
      'a transform of eleven numbers',
      model(boxObject(1), '<item objectid="1" transform="1 0 0 0 1 0 0 0 1 0 0"/>'),
      'bad-model',
    ],
    [
      'a transform that flattens',
      model(boxObject(1), '<item objectid="1" transform="1 0 0 0 1 0 0 0 0 0 0 0"/>'),
      'bad-model',
    ],
    [
      'a transform beyond all bounds',
      model(boxObject(1), '<item objectid="1" transform="1e200 0 0 0 1e200 0 0 0 1e308 0 0 0"/>'),
      'non-finite-coordinate',
    ],
    ['a coordinate in hexadecimal', plain.replace('x="2"', 'x="0x2"'), 'non-finite-coordinate'],
    ['a vertex without a coordinate', plain.replace('x="2"', ''), 'non-finite-coordinate'],
    ['half an index', plain.replace('v2="1"', 'v2="1.5"'), 'bad-index'],
    ['an entity that is not declared', plain.replace('<resources>', '<resources>&boom;'), 'bad-xml'],
    ['a document type in lower case', plain.replace('<model', '<!doctype x><model'), 'doctype-forbidden'],
    ['another encoding', plain.replace('UTF-8', 'ISO-8859-1'), 'bad-encoding'],
    ['objects of the same number', model(boxObject(1) + boxObject(1), '<item objectid="1"/>'), 'bad-model'],
    [
      'an extension that changes the shape',
      model(
        boxObject(1),
        '<item objectid="1"/>',
        'xmlns:b="http://schemas.microsoft.com/3dmanufacturing/beamlattice/2017/02" requiredextensions="b"',
      ),
      'unsupported-extension',
    ],
    [
      'an unbound required extension',
      model(boxObject(1), '<item objectid="1"/>', 'requiredextensions="q"'),
      'unsupported-extension',
    ],
    [
      'no triangles at all',
      model('<object id="1"><mesh><vertices/><triangles/></mesh></object>', '<item objectid="1"/>'),
      'no-triangles',
    ],
  ])('is refused with %s', (_, text, code) => {
    expect(codeOf(archive(text))).toBe(code);
  });

  it('is refused when its document type hides behind a long comment', () => {
    const hidden = plain.replace(
      '<model',
      `<!--${'x'.repeat(300_000)}--><!DOCTYPE x [<!ENTITY a "b">]><model`,
    );
    expect(codeOf(archive(hidden))).toBe('doctype-forbidden');
  });

  it('is refused when its components contain each other, or go very deep', () => {
    const link = (id: number, to: number): string =>
      `<object id="${id}"><components><component objectid="${to}"/></components></object>`;
    expect(codeOf(archive(model(link(1, 2) + link(2, 1), '<item objectid="1"/>')))).toBe('component-cycle');
    const chain = Array.from({ length: 5000 }, (_, i) => link(i + 2, i + 1)).join('');
    expect(codeOf(archive(model(boxObject(1) + chain, '<item objectid="5001"/>')))).toBe('bad-model');
  });

  it('is refused when a directory that lies hides a bomb', () => {
    const bytes = archive(plain.replace('<resources>', `<resources>${' '.repeat(40_000_000)}`));
    const at = sizeFieldOf(bytes, '3D/part.model');
    new DataView(bytes.buffer).setUint32(at, 1000, true);
    expect(codeOf(bytes)).toBe('inflates-too-far');
  });

  it.each(['../evil.txt', '/etc/evil.txt', 'a\\..\\evil.txt', 'C:/evil.txt', 'a/./b.txt'])(
    'is refused with an entry named %s',
    (name) => {
      expect(codeOf(archive(plain, { [name]: strToU8('x') }))).toBe('unsafe-path');
    },
  );

  it('is refused when two entries differ only in case', () => {
    expect(codeOf(archive(plain, { '3d/PART.model': strToU8(plain) }))).toBe('duplicate-entry');
  });

  it('is refused when any byte of its model was changed on the way', () => {
    const bytes = zipSync(
      { '_rels/.rels': strToU8(RELATIONSHIPS), '3D/part.model': strToU8(plain) },
      { level: 0 },
    );
    const at = indexOf(bytes, 'x="2"') + 3;
    bytes[at] = '3'.charCodeAt(0);
    expect(codeOf(bytes)).toBe('crc');
  });

  it('never crashes the reader when bytes are changed or cut off', () => {
    const whole = archive(plain);
    for (let at = 0; at < whole.length; at += 7) {
      const bytes = whole.slice();
      bytes[at]! ^= 0xff;
      expect(typeof codeOf(bytes)).toBe('string');
      expect(codeOf(whole.subarray(0, at))).not.toBe('read');
    }
  });
});

/** Where the central directory states the unpacked size of an entry. */
function sizeFieldOf(bytes: Uint8Array, name: string): number {
  const last = indexOf(bytes, name, indexOf(bytes, name) + 1);
  return last - 46 + 24;
}

function indexOf(bytes: Uint8Array, text: string, from = 0): number {
  return String.fromCharCode(...bytes).indexOf(text, from);
}
