import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { SqlPart } from '../database/sql-part.js';

export interface ReportedPrinting {
  readonly nozzlesMm: readonly number[];
  readonly materials: readonly string[];
}

/** Those who reported how parts fit, as parts of other rooms' queries. */
@Injectable()
export class ReporterParts {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** One column: the ids of those who reported one of these parts of a kit. */
  ofParts(kitId: string, partCodes: readonly string[]): SqlPart {
    return {
      sql: 'SELECT person_id FROM fit_reports WHERE kit_id = :reportedKitId AND part_code IN (:reportedCodes)',
      values: { reportedKitId: kitId, reportedCodes: partCodes },
    };
  }

  /** One column: the ids of those whose reports name one of the nozzles and one of the materials. */
  printingWith({ nozzlesMm, materials }: ReportedPrinting): SqlPart {
    const wishes = [
      nozzlesMm.length > 0 ? 'nozzle_mm IN (:reportedNozzles)' : undefined,
      materials.length > 0 ? 'material IN (:reportedMaterials)' : undefined,
    ].filter((wish) => wish !== undefined);
    return {
      sql: `SELECT person_id FROM fit_reports WHERE ${wishes.join(' AND ') || 'TRUE'}`,
      values: { reportedNozzles: nozzlesMm, reportedMaterials: materials },
    };
  }

  async choices(): Promise<ReportedPrinting & { partsByKit: Map<string, string[]> }> {
    const [rows, parts] = await Promise.all([
      selectRows<{ nozzle: number | string; material: string }>(
        this.database,
        'SELECT DISTINCT nozzle_mm AS nozzle, material FROM fit_reports LIMIT 500',
      ),
      selectRows<{ kitId: string; code: string }>(
        this.database,
        'SELECT DISTINCT kit_id AS kitId, part_code AS code FROM fit_reports ORDER BY kit_id, part_code LIMIT 2000',
      ),
    ]);
    const partsByKit = new Map<string, string[]>();
    for (const { kitId, code } of parts) partsByKit.set(kitId, [...(partsByKit.get(kitId) ?? []), code]);
    return {
      nozzlesMm: [...new Set(rows.map(({ nozzle }) => Number(nozzle)))],
      materials: [...new Set(rows.map(({ material }) => material))],
      partsByKit,
    };
  }
}
