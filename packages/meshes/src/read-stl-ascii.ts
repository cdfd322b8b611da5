import type { Mesh } from './mesh.js';
import type { Refuse } from './mesh-error.js';
import { scanNumber } from './scan-number.js';

/**
 * ASCII STL: `facet … vertex x y z ×3 … endfacet`, any case, any white space, any number of `solid` blocks.
 * Read straight from the bytes (a text of 500 MB would not fit a JavaScript string).
 *
 * @throws MeshError `no-triangles`, `truncated`, `bad-stl-text`, `too-many-triangles`,
 * `non-finite-coordinate`.
 */
export function readStlAscii(bytes: Uint8Array, maxTriangles: number, refuse: Refuse): Mesh {
  const reader = new StlTextReader(bytes, maxTriangles, refuse);
  return reader.read();
}

const NEWLINE = 10;
const CARRIAGE_RETURN = 13;

class StlTextReader {
  private position = 0;
  private line = 1;
  private corners = new Float64Array(9 * 1024);
  private used = 0;
  private start = 0;
  private end = 0;

  constructor(
    private readonly bytes: Uint8Array,
    private readonly maxTriangles: number,
    private readonly refuse: Refuse,
  ) {}

  read(): Mesh {
    if (bytes3(this.bytes)) this.position = 3;
    this.expect('solid');
    let isOpen = true;
    this.skipLine();
    while (this.next()) {
      if (isOpen && this.is('facet')) this.readFacet();
      else if (isOpen && this.is('endsolid')) {
        isOpen = false;
        this.skipLine();
      } else if (!isOpen && this.is('solid')) {
        isOpen = true;
        this.skipLine();
      } else if (this.used === 0) throw this.noTriangles();
      else throw this.unexpected(isOpen ? '“facet” or “endsolid”' : '“solid”');
    }
    const triangles = this.used / 9;
    if (triangles === 0) throw this.noTriangles();
    if (isOpen) throw this.cutOff();
    return { format: 'stl-ascii', triangles, corners: this.corners.slice(0, this.used), statedUnit: null };
  }

  private readFacet(): void {
    if (this.used / 9 >= this.maxTriangles) {
      throw this.refuse(
        'too-many-triangles',
        `holds more than ${this.maxTriangles} triangles. Export it coarser.`,
      );
    }
    if (this.used + 9 > this.corners.length) this.grow();
    // Stated normals are often wrong or not numbers at all; the winding decides, so they are passed over.
    this.expect('normal');
    for (let axis = 0; axis < 3; axis += 1) this.next();
    this.expect('outer');
    this.expect('loop');
    for (let corner = 0; corner < 3; corner += 1) {
      this.expect('vertex');
      for (let axis = 0; axis < 3; axis += 1) this.readCoordinate();
    }
    this.expect('endloop');
    this.expect('endfacet');
  }

  private readCoordinate(): void {
    if (!this.next()) throw this.cutOff();
    const value = scanNumber(this.bytes, this.start, this.end);
    if (value === null) {
      if (this.end === this.bytes.length) throw this.cutOff();
      throw this.unexpected('a number');
    }
    if (!Number.isFinite(value)) {
      throw this.refuse(
        'non-finite-coordinate',
        `has a corner that is not a finite number (“${this.word()}”) in line ${this.line}; export it again.`,
      );
    }
    this.corners[this.used] = value;
    this.used += 1;
  }

  private next(): boolean {
    const { bytes } = this;
    let at = this.position;
    while (at < bytes.length && bytes[at]! <= 32) {
      if (bytes[at] === NEWLINE) this.line += 1;
      at += 1;
    }
    this.start = at;
    while (at < bytes.length && bytes[at]! > 32) at += 1;
    this.end = at;
    this.position = at;
    return this.start < this.end;
  }

  private is(keyword: string): boolean {
    if (this.end - this.start !== keyword.length) return false;
    for (let i = 0; i < keyword.length; i += 1) {
      if ((this.bytes[this.start + i]! | 32) !== keyword.charCodeAt(i)) return false;
    }
    return true;
  }

  private expect(keyword: string): void {
    if (!this.next()) throw this.cutOff();
    if (!this.is(keyword)) {
      if (this.end === this.bytes.length && keyword.startsWith(this.word().toLowerCase()))
        throw this.cutOff();
      throw this.unexpected(`“${keyword}”`);
    }
  }

  private skipLine(): void {
    const { bytes } = this;
    let at = this.position;
    while (at < bytes.length && bytes[at] !== NEWLINE && bytes[at] !== CARRIAGE_RETURN) at += 1;
    this.position = at;
  }

  private grow(): void {
    const larger = new Float64Array(this.corners.length * 2);
    larger.set(this.corners);
    this.corners = larger;
  }

  private word(): string {
    return String.fromCharCode(...this.bytes.subarray(this.start, Math.min(this.end, this.start + 24)));
  }

  private noTriangles() {
    return this.refuse(
      'no-triangles',
      'holds no triangles: there is no “facet” in the text. Export it again.',
    );
  }

  private cutOff() {
    const whole = Math.floor(this.used / 9);
    return this.refuse(
      'truncated',
      `is cut off: the text ends in line ${this.line} after ${whole} whole triangles, without “endsolid” (${this.bytes.length} bytes found). Copy or export it again.`,
    );
  }

  private unexpected(wanted: string) {
    return this.refuse(
      'bad-stl-text',
      `is no valid STL text: line ${this.line} has “${this.word()}” where ${wanted} belongs. Export it again.`,
    );
  }
}

/** A byte order mark before the text. */
function bytes3(bytes: Uint8Array): boolean {
  return bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
}
