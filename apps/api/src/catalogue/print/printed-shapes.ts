import type { PrintSpecification, VariantClearance } from '@windchest/contracts';
import type { PrintProfile } from '@windchest/plates';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { fromJson } from '../json-column.js';
import type { Part } from '../revisions/part.model.js';

export interface PrintedShape extends MeshShape {
  readonly code: string;
  readonly name: string;
  readonly quantity: number;
  readonly orientation: Part['orientation'];
  /** Its own settings, where they differ from the revision's. */
  readonly printSpec: PrintSpecification | null;
  readonly isGauge: boolean;
  /** In other clearances, tightest first; only what is measured. */
  readonly variants: readonly (MeshShape & { readonly clearance: VariantClearance })[];
}

interface MeshShape {
  /** As exported; null until the file is measured. */
  readonly sizeMm: readonly [number, number, number] | null;
  /** Convex outline from above, in mm. */
  readonly footprint: readonly (readonly [number, number])[] | null;
  readonly profile: PrintProfile | null;
}

interface MeshRow {
  measurement: unknown;
  footprint: unknown;
  print_profile: unknown;
}
interface Row extends MeshRow {
  id: string;
  code: string;
  name: string;
  quantity: number | string;
  orientation: Part['orientation'];
  print_spec: unknown;
  is_gauge: number | boolean;
}
interface VariantRow extends MeshRow {
  part_id: string;
  clearance: VariantClearance;
}

/** The parts of a revision with what plates and estimates are made from. */
export const printedShapesOf = async (database: Sequelize, revisionId: string): Promise<PrintedShape[]> => {
  const rows = await selectRows<Row>(
    database,
    `SELECT p.id, p.code, p.name, p.quantity, p.orientation, p.print_spec, p.is_gauge, m.measurement, m.footprint, m.print_profile
     FROM parts p LEFT JOIN revision_files f ON f.id = p.file_id LEFT JOIN measurements m ON m.sha256 = f.sha256
     WHERE p.revision_id = :revisionId ORDER BY p.code`,
    { revisionId },
  );
  const variants = await selectRows<VariantRow>(
    database,
    `SELECT v.part_id, v.clearance, m.measurement, m.footprint, m.print_profile
     FROM part_variants v JOIN revision_files f ON f.id = v.file_id JOIN measurements m ON m.sha256 = f.sha256
     WHERE v.revision_id = :revisionId ORDER BY v.clearance`,
    { revisionId },
  );
  return rows.map((row) => ({
    code: row.code,
    name: row.name,
    quantity: Number(row.quantity),
    orientation: row.orientation,
    printSpec: fromJson<PrintSpecification>(row.print_spec),
    isGauge: Boolean(row.is_gauge),
    ...shapeOf(row),
    variants: variants
      .filter((one) => one.part_id === row.id)
      .map((one) => ({ clearance: one.clearance, ...shapeOf(one) })),
  }));
};

const shapeOf = (row: MeshRow): MeshShape => ({
  sizeMm: fromJson<{ sizeMm: [number, number, number] }>(row.measurement)?.sizeMm ?? null,
  footprint: fromJson<[number, number][]>(row.footprint),
  profile: fromJson<PrintProfile>(row.print_profile),
});
