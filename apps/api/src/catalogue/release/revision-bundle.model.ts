import type { Clearance } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { NumberColumn } from '../number-column.js';

/** A released revision's bundle of one clearance; the one that holds all of them stands with the revision. */
@Table({ tableName: 'revision_bundles', timestamps: false })
export class RevisionBundle extends Model {
  @Column({ type: DataType.CHAR(36), primaryKey: true }) declare revisionId: string;
  @Column({ type: DataType.STRING(10), primaryKey: true }) declare clearance: Clearance;
  @Column(DataType.CHAR(64)) declare sha256: string;
  @NumberColumn('bytes', DataType.BIGINT.UNSIGNED) declare bytes: number;
}
