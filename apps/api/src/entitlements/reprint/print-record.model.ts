import type { Clearance } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

/**
 * Pieces of a part that somebody printed, of one revision and clearance. None at all is a word too: the part
 * is then not printed, whatever revision is held.
 */
@Table({ tableName: 'print_records', timestamps: false })
export class PrintRecord extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare personId: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.STRING(10)) declare partCode: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  /** The zero also for a part that comes in one. */
  @Column(DataType.STRING(10)) declare clearance: Clearance;
  @Column(DataType.INTEGER.UNSIGNED) declare quantity: number;
  @Column(DataType.STRING(128)) declare geometryHash: string | null;
  @MomentColumn() declare at: Date;
}
