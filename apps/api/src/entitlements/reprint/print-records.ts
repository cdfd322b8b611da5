import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Clearance } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { PrintedPieces } from './reprint-list.js';

interface Row {
  person_id: string;
  part_code: string;
  revision_id: string;
  clearance: Clearance;
  quantity: number | string;
  geometry_hash: string | null;
}

type PiecesByCode = Map<string, PrintedPieces[]>;

/** What people said they have printed, to read. */
@Injectable()
export class PrintRecords {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** By person, then by part code; nothing for who said nothing. */
  async ofMany(kitId: string, personIds: readonly string[]): Promise<Map<string, PiecesByCode>> {
    if (personIds.length === 0) return new Map();
    const rows = await selectRows<Row>(
      this.database,
      `SELECT person_id, part_code, revision_id, clearance, quantity, geometry_hash FROM print_records
       WHERE kit_id = :kitId AND person_id IN (:personIds) ORDER BY part_code, at DESC, id`,
      { kitId, personIds },
    );
    const byPerson = new Map<string, PiecesByCode>();
    for (const row of rows) {
      const codes = byPerson.get(row.person_id) ?? new Map<string, PrintedPieces[]>();
      const pieces = codes.get(row.part_code) ?? [];
      pieces.push({
        revisionId: row.revision_id,
        clearance: row.clearance,
        quantity: Number(row.quantity),
        geometryHash: row.geometry_hash,
      });
      byPerson.set(row.person_id, codes.set(row.part_code, pieces));
    }
    return byPerson;
  }
}
