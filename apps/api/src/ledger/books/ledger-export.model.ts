import type { YearExport } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

/** An export of a year: asked for, written by a job, then there to be fetched. */
@Table({ tableName: 'ledger_exports', timestamps: false })
export class LedgerExport extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.SMALLINT.UNSIGNED) declare year: number;
  @Column(DataType.STRING(10)) declare state: YearExport['state'];
  @Column(DataType.TINYINT.UNSIGNED) declare percent: number;
  @Column(DataType.STRING(120)) declare storageKey: string | null;
  @Column(DataType.CHAR(64)) declare sha256: string | null;
  @Column(DataType.BIGINT.UNSIGNED) declare bytes: number | string | null;
  @Column(DataType.STRING(500)) declare fault: string | null;
  @Column(DataType.STRING(200)) declare askedBy: string;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn({ isNullable: true }) declare finishedAt: Date | null;
}
