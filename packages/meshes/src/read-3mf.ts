import type { LengthUnit, Mesh } from './mesh.js';
import type { Refuse } from './mesh-error.js';
import { openXmlParser } from './parse-xml.js';
import { expandBuild } from './three-mf-build.js';
import { ModelPartReader, type ModelPart } from './three-mf-model.js';
import { readZipDirectory, type ZipEntry } from './zip-directory.js';
import { inflateEntry, newInflateBudget, requireModestRatios, type InflateBudget } from './zip-inflate.js';

const RELATIONSHIPS = '_rels/.rels';
const MODEL_RELATIONSHIP = 'http://schemas.microsoft.com/3dmanufacturing/2013/01/3dmodel';

const UNIT_MM: Readonly<Record<LengthUnit, number>> = {
  micron: 0.001,
  millimeter: 1,
  centimeter: 10,
  inch: 25.4,
  foot: 304.8,
  meter: 1000,
};

/**
 * Reads what a 3MF package says to build, as triangles in mm: relationships → model part → objects,
 * components and build items with their transforms (3MF core specification 1.3; packaging by OPC, ECMA-376
 * part 2). Objects that nothing builds are left out, as the specification asks.
 *
 * @throws MeshError for broken or hostile archives and models.
 */
export function read3mf(bytes: Uint8Array, maxTriangles: number, refuse: Refuse): Mesh {
  const archive = new Package(bytes, refuse);
  const rootName = archive.modelPartName();
  const parts = new Map<string, ModelPart>();
  const partAt = (path: string): ModelPart => {
    const known = parts.get(path);
    if (known !== undefined) return known;
    const part = archive.readModel(path, path === rootName);
    parts.set(path, part);
    return part;
  };
  const root = partAt(rootName);
  const unit = root.unit ?? 'millimeter';
  const corners = expandBuild(
    { rootName, partAt, unit, unitMm: UNIT_MM[unit], maxTriangles, normalise: partKey },
    refuse,
  );
  return { format: '3mf', triangles: corners.length / 9, corners, statedUnit: root.unit };
}

class Package {
  private readonly entries: ReadonlyMap<string, ZipEntry>;
  private readonly budget: InflateBudget = newInflateBudget();

  constructor(
    private readonly bytes: Uint8Array,
    private readonly refuse: Refuse,
  ) {
    this.entries = readZipDirectory(bytes, refuse);
    requireModestRatios(this.entries.values(), refuse);
  }

  modelPartName(): string {
    const entry = this.entries.get(RELATIONSHIPS);
    if (entry === undefined) {
      throw this.refuse(
        'no-relationships',
        `is no complete 3MF file: “${RELATIONSHIPS}” is missing. Export it again.`,
      );
    }
    const targets = new Set<string>();
    const parser = openXmlParser(
      entry.name,
      {
        onOpen: (name, { Type, Target }) => {
          const isRelationship = name === 'Relationship' || name.endsWith(':Relationship');
          if (isRelationship && Type === MODEL_RELATIONSHIP && Target !== undefined)
            targets.add(partKey(Target));
        },
      },
      this.refuse,
    );
    inflateEntry(this.bytes, entry, this.budget, parser.write, this.refuse);
    parser.end();
    const [first, second] = targets;
    if (first === undefined) {
      throw this.refuse('no-model', `holds no model: “${RELATIONSHIPS}” points to none. Export it again.`);
    }
    if (second !== undefined) {
      throw this.refuse(
        'ambiguous-model',
        `points to more than one model (“${first}”, “${second}”); readers would disagree on which one counts.`,
      );
    }
    return first;
  }

  readModel(path: string, isRoot: boolean): ModelPart {
    const entry = this.entries.get(path);
    if (entry === undefined) {
      throw this.refuse(
        'no-model',
        `holds no model: “${path}” is named in it but is not there. Export it again.`,
      );
    }
    const reader = new ModelPartReader(entry.name, this.refuse);
    inflateEntry(this.bytes, entry, this.budget, (piece) => reader.write(piece), this.refuse);
    return reader.end(isRoot);
  }
}

/** OPC part names start with "/", are compared without regard to case, and may be percent-encoded. */
function partKey(target: string): string {
  let name = target;
  try {
    name = decodeURIComponent(target);
  } catch {
    // A stray "%" stands for itself.
  }
  return name.replace(/^\/+/, '').toLowerCase();
}
