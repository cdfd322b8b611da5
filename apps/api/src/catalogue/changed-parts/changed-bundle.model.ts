import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { MomentColumn } from '../../database/columns.js';
import { NumberColumn } from '../number-column.js';
import type { ChangedPartsNeed } from './changed-parts-need.js';

/** A bundle of what is to print for a revision: one for everybody who needs the same. */
@Table({ tableName: 'changed_bundles', timestamps: false })
export class ChangedBundle extends Model {
  @Column({ type: DataType.CHAR(64), primaryKey: true }) declare needHash: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.JSON) declare need: ChangedPartsNeed;
  @Column(DataType.STRING(10)) declare state: 'waiting' | 'building' | 'ready' | 'failed';
  @Column(DataType.TINYINT.UNSIGNED) declare percent: number;
  @Column(DataType.TEXT) declare fault: string | null;
  @Column(DataType.CHAR(64)) declare sha256: string | null;
  @NumberColumn('bytes', DataType.BIGINT.UNSIGNED) declare bytes: number | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare usedAt: Date;
}
