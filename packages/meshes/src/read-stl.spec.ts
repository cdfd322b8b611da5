import fc from 'fast-check';
import { boxCorners, meshOf } from '../fixtures/solids.js';
import { MeshError, measure, readMesh, writeBinaryStl } from './index.js';
import { scanNumber } from './scan-number.js';

function ascii(text: string): Uint8Array {
  return Uint8Array.from(text, (letter) => letter.charCodeAt(0));
}

function asciiStl(corners: ArrayLike<number>, write: (value: number) => string = String): string {
  const facets: string[] = [];
  for (let o = 0; o < corners.length; o += 9) {
    const vertex = (at: number): string =>
      `vertex ${[0, 1, 2].map((axis) => write(corners[at + axis]!)).join(' ')}`;
    facets.push(
      `facet normal 0 0 0\nouter loop\n${vertex(o)}\n${vertex(o + 3)}\n${vertex(o + 6)}\nendloop\nendfacet\n`,
    );
  }
  return `solid part\n${facets.join('')}endsolid part\n`;
}

function refusal(bytes: Uint8Array, fileName = 'part.stl', maxTriangles?: number): MeshError {
  try {
    readMesh(bytes, { fileName, maxTriangles });
  } catch (error) {
    if (error instanceof MeshError) return error;
    throw error;
  }
  throw new Error('the file was read');
}

const box = boxCorners([3, 4, 5]);

describe('a binary STL file', () => {
  it('comes back as it was written', () => {
    fc.assert(
      fc.property(
        fc.array(fc.float({ min: -1000, max: 1000, noNaN: true }), { minLength: 9, maxLength: 9 }),
        (numbers) => {
          const corners = [...box, ...numbers];
          expect(Array.from(readMesh(writeBinaryStl(corners), { fileName: 'a.stl' }).corners)).toEqual(
            corners,
          );
        },
      ),
    );
  });

  it('is read at any place in a larger buffer', () => {
    const stl = writeBinaryStl(box);
    for (const offset of [1, 2, 3]) {
      const larger = new Uint8Array(stl.length + 8);
      larger.set(stl, offset);
      const mesh = readMesh(larger.subarray(offset, offset + stl.length), { fileName: 'a.stl' });
      expect(measure(mesh).volumeMm3).toBeCloseTo(60, 9);
    }
  });

  it('cannot be written from half a triangle', () => {
    expect(() => writeBinaryStl([1, 2, 3])).toThrow(RangeError);
  });

  it('is refused with expected and found bytes at every length but its own', () => {
    const stl = writeBinaryStl(box);
    fc.assert(
      fc.property(fc.integer({ min: 85, max: stl.length - 1 }), (length) => {
        const { code, message } = refusal(stl.subarray(0, length));
        expect(['truncated', 'count-mismatch', 'not-an-stl']).toContain(code);
        if (code === 'not-an-stl') return;
        expect(message).toContain(`need ${stl.length} bytes`);
        expect(message).toContain(`it has ${length} bytes`);
      }),
    );
  });

  it('may be padded with zero bytes, but not with others', () => {
    const padded = new Uint8Array(writeBinaryStl(box).length + 100);
    padded.set(writeBinaryStl(box));
    expect(readMesh(padded, { fileName: 'a.stl' }).triangles).toBe(12);
    padded[padded.length - 1] = 1;
    expect(refusal(padded).code).toBe('count-mismatch');
  });

  it('names the triangle that holds a number beyond all bounds', () => {
    const stl = writeBinaryStl(box);
    new DataView(stl.buffer).setFloat32(84 + 50 * 7 + 12, -Infinity, true);
    const { code, message } = refusal(stl);
    expect(code).toBe('non-finite-coordinate');
    expect(message).toContain('triangle 8');
  });

  it('is refused when it holds more triangles than are read', () => {
    expect(refusal(writeBinaryStl(box), 'part.stl', 11).code).toBe('too-many-triangles');
  });
});

describe('an ASCII STL file', () => {
  it('gives the same solid as the binary one, to the last bit of single precision', () => {
    const mesh = readMesh(ascii(asciiStl(box)), { fileName: 'a.stl' });
    expect(Array.from(mesh.corners)).toEqual(box);
    expect(mesh.format).toBe('stl-ascii');
  });

  it('may have old line ends, tabs, capitals, plus signs and a byte order mark', () => {
    const text = asciiStl(box, (value) => `+${value}.e+0`)
      .replaceAll('\n', '\r')
      .replaceAll(' ', '\t');
    const bytes = ascii(`\xef\xbb\xbf${text.toUpperCase()}`);
    expect(measure(readMesh(bytes, { fileName: 'a.stl' })).volumeMm3).toBeCloseTo(60, 9);
  });

  it('is refused, naming the line, where a word is out of place', () => {
    const { code, message } = refusal(ascii(asciiStl(box).replace('vertex 3 0 5', 'vertex 3 zero 5')));
    expect(code).toBe('bad-stl-text');
    expect(message).toMatch(/line \d+ has “zero” where a number belongs/);
  });

  it('is refused wherever it is cut off after its first triangle', () => {
    const bytes = ascii(
      asciiStl(box)
        .trimEnd()
        .replace(/endsolid part$/, 'endsolid'),
    );
    fc.assert(
      fc.property(fc.integer({ min: 160, max: bytes.length - 1 }), (length) => {
        expect(['truncated', 'bad-stl-text']).toContain(refusal(bytes.subarray(0, length)).code);
      }),
    );
  });

  it('is refused where a comma stands for the decimal point', () => {
    expect(refusal(ascii(asciiStl(box, (value) => `${value},5`))).code).toBe('bad-stl-text');
  });
});

describe('a number in text', () => {
  const read = (text: string): number | null => scanNumber(ascii(text), 0, text.length);

  it('is read exactly as the language reads it', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        // JavaScript writes −0 without its sign.
        expect(read(String(value))).toBe(value + 0);
        expect(read(value.toExponential(8))).toBe(Number(value.toExponential(8)));
        expect(read(value.toPrecision(17))).toBe(value + 0);
      }),
    );
  });

  it.each(['', '-', '.', '1e', '0x10', '1.2.3', '1-2', 'solid', '--1'])('is not “%s”', (text) => {
    expect(read(text)).toBeNull();
  });

  it.each(['nan', 'NaN', '-nan(ind)', '1.#QNAN', 'inf', '-Infinity', '1e999'])(
    'is not finite as “%s”',
    (text) => {
      expect(Number.isFinite(read(text))).toBe(false);
      expect(read(text)).not.toBeNull();
    },
  );
});

describe('a file that is no mesh', () => {
  it.each([
    ['%PDF-1.7 ...', 'a PDF document'],
    ['ISO-10303-21;\nHEADER;', 'a STEP file'],
    ['<!DOCTYPE html><html></html>', 'HTML or XML text'],
  ])('is recognised by its first bytes: %s', (text, name) => {
    const { code, message } = refusal(ascii(text.padEnd(200)));
    expect(code).toBe('not-an-stl');
    expect(message).toContain(name);
  });

  it('never crashes the reader, whatever its bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), fc.constantFrom('a.stl', 'a.3mf'), (bytes, fileName) => {
        expect(refusal(bytes, fileName).message).toContain(`“${fileName}”`);
      }),
    );
  });

  it('is a sheet without thickness', () => {
    const sheet = meshOf([0, 0, 1, 9, 0, 1, 0, 9, 1]);
    expect(refusal(writeBinaryStl(sheet.corners)).code).toBe('no-volume');
  });
});
