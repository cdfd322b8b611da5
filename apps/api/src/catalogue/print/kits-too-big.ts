import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { fitPart, type Bed, type OrientationRule } from '@windchest/plates';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { fromJson } from '../json-column.js';

interface Row {
  revision_id: string;
  orientation: OrientationRule;
  width_mm: number | null;
  depth_mm: number | null;
  height_mm: number | null;
  footprint: unknown;
}

/** As exported, turned by a quarter, or laid on a side: what boxes alone can tell, which settles most parts. */
const FITS_AS_A_BOX = `(
  (m.height_mm <= :z AND m.width_mm <= :x AND m.depth_mm <= :y)
  OR (p.orientation <> 'as-exported' AND m.height_mm <= :z AND m.width_mm <= :y AND m.depth_mm <= :x)
  OR (p.orientation = 'may-lie' AND (
    (m.depth_mm <= :z AND LEAST(m.width_mm, m.height_mm) <= LEAST(:x, :y) AND GREATEST(m.width_mm, m.height_mm) <= GREATEST(:x, :y))
    OR (m.width_mm <= :z AND LEAST(m.depth_mm, m.height_mm) <= LEAST(:x, :y) AND GREATEST(m.depth_mm, m.height_mm) <= GREATEST(:x, :y))
  ))
)`;
/** Only here can an odd angle help, so only here is the outline worth its reading. */
const MAY_FIT_ASLANT = `(p.orientation <> 'as-exported' AND m.height_mm <= :z
  AND GREATEST(m.width_mm, m.depth_mm) <= SQRT(:x * :x + :y * :y))`;

/** Which kits of the shop do not print on a bed: those with a part that fits in no way its rule allows. */
@Injectable()
export class KitsTooBig {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** @returns ids of newest revisions; a part without measurements counts as too big, for nobody can promise it */
  async revisionsFor(bed: Bed): Promise<string[]> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT p.revision_id, p.orientation, m.width_mm, m.depth_mm, m.height_mm,
              CASE WHEN ${MAY_FIT_ASLANT} THEN m.footprint END AS footprint
       FROM kits k JOIN revisions r ON r.id = k.newest_revision_id JOIN parts p ON p.revision_id = r.id
       LEFT JOIN revision_files f ON f.id = p.file_id LEFT JOIN measurements m ON m.sha256 = f.sha256
       WHERE k.is_listed AND r.state = 'released' AND NOT COALESCE(${FITS_AS_A_BOX}, FALSE)`,
      { x: bed.xMm, y: bed.yMm, z: bed.zMm },
    );
    const tooBig = new Set<string>();
    for (const row of rows)
      if (!tooBig.has(row.revision_id) && isTooBig(row, bed)) tooBig.add(row.revision_id);
    return [...tooBig];
  }
}

const isTooBig = ({ orientation, width_mm, depth_mm, height_mm, footprint }: Row, bed: Bed): boolean => {
  if (!width_mm || !depth_mm || !height_mm) return true;
  const outline = fromJson<[number, number][]>(footprint);
  const part = {
    sizeMm: [width_mm, depth_mm, height_mm] as const,
    orientation,
    ...(outline && { footprint: outline }),
  };
  return fitPart(part, bed).fit === 'too-big';
};
