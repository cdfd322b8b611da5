import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { PrintSpecification, VariantClearance, VoiceWithNote } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { isMeshKind, type FileKind } from '../files/file-kind.js';
import type { Drawings, MeasuredMesh } from '../files/measured-mesh.js';
import { fromJson } from '../json-column.js';
import type { Part, ReprintMark } from './part.model.js';

export interface FileOfRevision {
  readonly id: string;
  readonly sha256: string;
  readonly fileName: string;
  readonly bytes: number;
  readonly kind: FileKind;
  readonly addedAt: Date;
  readonly measuring: 'not-a-mesh' | 'waiting' | 'measuring' | 'measured' | 'refused';
  readonly measured: MeasuredMesh | null;
  readonly geometryHash: string | null;
  readonly drawings: Drawings | null;
  readonly previewSha256: string | null;
  /** A whole sentence that names the file and the fault. */
  readonly fault: string | null;
}

export interface PartOfRevision {
  readonly id: string;
  readonly revisionId: string;
  readonly code: string;
  readonly name: string;
  readonly quantity: number;
  readonly orientation: Part['orientation'];
  readonly printSpec: PrintSpecification | null;
  readonly voice: VoiceWithNote | null;
  readonly mark: ReprintMark | null;
  readonly reason: string;
  readonly isGauge: boolean;
  /** The zero where the part comes in several clearances. */
  readonly file: FileOfRevision | null;
  readonly variants: readonly { readonly clearance: VariantClearance; readonly file: FileOfRevision }[];
}

interface FileRow {
  id: string;
  sha256: string;
  file_name: string;
  bytes: string | number;
  kind: FileKind;
  created_at: Date;
  state: 'waiting' | 'measuring' | 'measured' | 'refused' | null;
  measurement: unknown;
  geometry_hash: string | null;
  drawings: unknown;
  preview_sha256: string | null;
  fault: string | null;
}
interface PartRow {
  id: string;
  revision_id: string;
  file_id: string | null;
  code: string;
  name: string;
  quantity: number;
  orientation: Part['orientation'];
  print_spec: unknown;
  voice: unknown;
  reprint_mark: ReprintMark | null;
  reprint_reason: string;
  is_gauge: number | boolean;
}
interface VariantRow {
  part_id: string;
  clearance: VariantClearance;
  file_id: string;
}

/** Reads what stands in a revision: its files with what they measure, and its parts. */
@Injectable()
export class RevisionContents {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async filesOf(revisionId: string, tx?: Tx): Promise<FileOfRevision[]> {
    const rows = await selectRows<FileRow>(
      this.database,
      `SELECT f.id, f.sha256, f.file_name, s.bytes, s.kind, f.created_at, m.state, m.measurement, m.geometry_hash, m.drawings, m.preview_sha256, m.fault
       FROM revision_files f JOIN stored_files s ON s.sha256 = f.sha256 LEFT JOIN measurements m ON m.sha256 = f.sha256
       WHERE f.revision_id = :revisionId ORDER BY f.file_name`,
      { revisionId },
      tx,
    );
    return rows.map(toFile);
  }

  async partsOf(revisionId: string, tx?: Tx): Promise<PartOfRevision[]> {
    const rows = await selectRows<PartRow>(
      this.database,
      `SELECT id, revision_id, file_id, code, name, quantity, orientation, print_spec, voice, reprint_mark, reprint_reason, is_gauge
       FROM parts WHERE revision_id = :revisionId ORDER BY code`,
      { revisionId },
      tx,
    );
    const files = new Map((await this.filesOf(revisionId, tx)).map((file) => [file.id, file]));
    const variants = await selectRows<VariantRow>(
      this.database,
      'SELECT part_id, clearance, file_id FROM part_variants WHERE revision_id = :revisionId ORDER BY clearance',
      { revisionId },
      tx,
    );
    return rows.map((row) => ({
      id: row.id,
      revisionId: row.revision_id,
      code: row.code,
      name: row.name,
      quantity: Number(row.quantity),
      orientation: row.orientation,
      printSpec: fromJson<PrintSpecification>(row.print_spec),
      voice: fromJson<VoiceWithNote>(row.voice),
      mark: row.reprint_mark,
      reason: row.reprint_reason,
      isGauge: Boolean(row.is_gauge),
      file: row.file_id ? (files.get(row.file_id) ?? null) : null,
      variants: variants
        .filter((one) => one.part_id === row.id)
        .flatMap(({ clearance, file_id }) => {
          const file = files.get(file_id);
          return file ? [{ clearance, file }] : [];
        }),
    }));
  }

  /** The parts that sound, without what their files measure. */
  async voicesOf(revisionId: string): Promise<{ code: string; voice: VoiceWithNote | null }[]> {
    const rows = await selectRows<Pick<PartRow, 'code' | 'voice'>>(
      this.database,
      'SELECT code, voice FROM parts WHERE revision_id = :revisionId AND voice IS NOT NULL',
      { revisionId },
    );
    return rows.map(({ code, voice }) => ({ code, voice: fromJson<VoiceWithNote>(voice) }));
  }

  /** Files that belong to no part: documents, pictures, sounds. */
  async documentsOf(revisionId: string, tx?: Tx): Promise<FileOfRevision[]> {
    return (await this.filesOf(revisionId, tx)).filter((file) => !isMeshKind(file.kind));
  }
}

const toFile = (row: FileRow): FileOfRevision => ({
  id: row.id,
  sha256: row.sha256,
  fileName: row.file_name,
  bytes: Number(row.bytes),
  kind: row.kind,
  addedAt: row.created_at,
  measuring: row.state ?? (isMeshKind(row.kind) ? 'waiting' : 'not-a-mesh'),
  measured: fromJson<MeasuredMesh>(row.measurement),
  geometryHash: row.geometry_hash,
  drawings: fromJson<Drawings>(row.drawings),
  previewSha256: row.preview_sha256,
  fault: row.fault === null ? null : `“${row.file_name}” ${row.fault}`,
});
