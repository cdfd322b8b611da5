import { GrowingDoubles } from './growing-array.js';
import type { LengthUnit } from './mesh.js';
import type { MeshErrorCode, Refuse } from './mesh-error.js';
import { openXmlParser, type XmlParser } from './parse-xml.js';
import { IDENTITY, determinant, parseTransform, type Transform } from './transform.js';

/** A placing of an object: a build item, or a component of another object. */
export interface Placing {
  readonly objectId: string;
  /** Another model part that holds the object (production extension), or null for the same one. */
  readonly partPath: string | null;
  readonly transform: Transform;
}

export interface ModelObject {
  readonly id: string;
  readonly vertices: GrowingDoubles;
  readonly indices: GrowingDoubles;
  readonly components: Placing[];
}

/** One model part, as written: lengths are in `unit`. */
export interface ModelPart {
  readonly unit: LengthUnit | null;
  readonly objects: ReadonlyMap<string, ModelObject>;
  readonly items: readonly Placing[];
}

const CORE = 'http://schemas.microsoft.com/3dmanufacturing/core/2015/02';
const PRODUCTION = 'http://schemas.microsoft.com/3dmanufacturing/production/2015/06';
/** Extensions whose content leaves the triangles as they are, so that a reader may do without it. */
const HARMLESS_EXTENSIONS = new Set([
  CORE,
  PRODUCTION,
  'http://schemas.microsoft.com/3dmanufacturing/material/2015/02',
  'http://schemas.microsoft.com/3dmanufacturing/slice/2015/07',
  'http://schemas.microsoft.com/3dmanufacturing/trianglesets/2021/07',
]);
const UNITS: readonly LengthUnit[] = ['micron', 'millimeter', 'centimeter', 'inch', 'foot', 'meter'];
const OBJECT_TYPES = ['model', 'solidsupport', 'support', 'surface', 'other'];

type Attributes = Readonly<Record<string, string>>;

/**
 * Collects one 3MF model part from its XML (3MF core specification 1.3; production extension 1.1 for parts
 * in several files). Elements of other name spaces are passed over.
 */
export class ModelPartReader {
  private readonly objects = new Map<string, ModelObject>();
  private readonly items: Placing[] = [];
  private readonly namespaces = new Map<string, string>();
  private unit: LengthUnit | null = null;
  private corePrefix = '';
  private current: ModelObject | null = null;
  private hasBuild = false;
  private readonly parser: XmlParser;

  constructor(
    private readonly partName: string,
    private readonly refuse: Refuse,
  ) {
    this.parser = openXmlParser(
      partName,
      {
        onOpen: (name, attributes, depth) => this.open(name, attributes, depth),
        onClose: (name) => this.close(name),
      },
      refuse,
    );
  }

  write(piece: Uint8Array): void {
    this.parser.write(piece);
  }

  /** @param isRoot whether this is the part that the package starts from, which must hold the build. */
  end(isRoot: boolean): ModelPart {
    this.parser.end();
    if (isRoot && !this.hasBuild)
      throw this.fault('bad-model', 'has no “build” element, so it says nothing to print');
    return { unit: this.unit, objects: this.objects, items: this.items };
  }

  private open(name: string, attributes: Attributes, depth: number): void {
    if (depth === 0) return this.openModel(name, attributes);
    if (!name.startsWith(this.corePrefix)) return undefined;
    const local = name.slice(this.corePrefix.length);
    if (local === 'vertex') return this.addVertex(attributes);
    if (local === 'triangle') return this.addTriangle(attributes);
    if (local === 'object') return this.openObject(attributes);
    if (local === 'component') {
      if (this.current === null) throw this.fault('bad-model', 'has a component outside of an object');
      this.current.components.push(this.placing(attributes));
    } else if (local === 'build') this.hasBuild = true;
    else if (local === 'item') this.items.push(this.placing(attributes));
    return undefined;
  }

  private close(name: string): void {
    if (name !== `${this.corePrefix}object` || this.current === null) return;
    const vertices = this.current.vertices.length / 3;
    const wrong = this.current.indices.values.find((index) => index >= vertices);
    if (wrong !== undefined) {
      throw this.fault(
        'bad-index',
        `has a triangle in object ${this.current.id} that uses corner ${wrong} of ${vertices} (counted from 0)`,
      );
    }
    this.current = null;
  }

  private openModel(name: string, attributes: Attributes): void {
    for (const [key, value] of Object.entries(attributes)) {
      if (key === 'xmlns') this.namespaces.set('', value);
      else if (key.startsWith('xmlns:')) this.namespaces.set(key.slice(6), value);
    }
    const colon = name.indexOf(':');
    this.corePrefix = name.slice(0, colon + 1);
    if (
      name.slice(colon + 1) !== 'model' ||
      this.namespaces.get(name.slice(0, Math.max(0, colon))) !== CORE
    ) {
      throw this.fault('bad-model', 'does not start with a 3MF “model” element');
    }
    for (const prefix of (attributes['requiredextensions'] ?? '').split(/\s+/).filter(Boolean)) {
      if (!HARMLESS_EXTENSIONS.has(this.namespaces.get(prefix) ?? '')) {
        throw this.fault(
          'unsupported-extension',
          `needs the 3MF extension “${this.namespaces.get(prefix) ?? prefix}”, which is not read; export plain triangles`,
        );
      }
    }
    const unit = attributes['unit'];
    if (unit === undefined) return;
    const known = UNITS.find((candidate) => candidate === unit);
    if (known === undefined)
      throw this.fault('bad-model', `states the unit “${unit}”, which 3MF does not know`);
    this.unit = known;
  }

  private openObject(attributes: Attributes): void {
    const id = attributes['id'] ?? '';
    const type = attributes['type'] ?? 'model';
    if (id === '' || this.objects.has(id))
      throw this.fault('bad-model', `has an object without a number of its own (id “${id}”)`);
    if (!OBJECT_TYPES.includes(type))
      throw this.fault('bad-model', `has an object of the unknown type “${type}”`);
    this.current = { id, vertices: new GrowingDoubles(), indices: new GrowingDoubles(), components: [] };
    this.objects.set(id, this.current);
  }

  private addVertex({ x, y, z }: Attributes): void {
    const vertices = this.current?.vertices;
    if (vertices === undefined) throw this.fault('bad-model', 'has a vertex outside of an object');
    vertices.push(this.coordinate(x));
    vertices.push(this.coordinate(y));
    vertices.push(this.coordinate(z));
  }

  private coordinate(text: string | undefined): number {
    const value = decimal(text);
    if (Number.isFinite(value)) return value;
    const where = this.current === null ? '' : ` in object ${this.current.id}`;
    throw this.fault(
      'non-finite-coordinate',
      `has a vertex${where} with a coordinate that is not a finite number (“${text ?? ''}”)`,
    );
  }

  private addTriangle({ v1, v2, v3 }: Attributes): void {
    const indices = this.current?.indices;
    if (indices === undefined) throw this.fault('bad-model', 'has a triangle outside of an object');
    indices.push(this.index(v1));
    indices.push(this.index(v2));
    indices.push(this.index(v3));
  }

  private index(text: string | undefined): number {
    const value = decimal(text);
    if (Number.isInteger(value) && value >= 0) return value;
    throw this.fault(
      'bad-index',
      `has a triangle with the corner “${text ?? ''}”, which is no whole number from 0`,
    );
  }

  private placing(attributes: Attributes): Placing {
    const text = attributes['transform'];
    const transform = text === undefined ? IDENTITY : parseTransform(text);
    if (transform === null || determinant(transform) === 0) {
      throw this.fault(
        'bad-model',
        `has a transform that is not 12 numbers or flattens the part (“${text ?? ''}”)`,
      );
    }
    return { objectId: attributes['objectid'] ?? '', partPath: this.productionPath(attributes), transform };
  }

  private productionPath(attributes: Attributes): string | null {
    for (const [key, value] of Object.entries(attributes)) {
      const colon = key.indexOf(':');
      if (
        colon > 0 &&
        key.slice(colon + 1) === 'path' &&
        this.namespaces.get(key.slice(0, colon)) === PRODUCTION
      ) {
        return value;
      }
    }
    return null;
  }

  private fault(code: MeshErrorCode, sentence: string) {
    return this.refuse(code, `cannot be read: “${this.partName}” ${sentence}.`);
  }
}

/** `Number` alone would take an empty text for 0 and read hexadecimal. */
function decimal(text: string | undefined): number {
  return text === undefined || text.trim() === '' || /^\s*0[xbo]/i.test(text) ? NaN : Number(text);
}
