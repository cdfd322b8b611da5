import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

/** One signed address that was given out, and what came of it. */
@Table({ tableName: 'downloads', timestamps: false })
export class Download extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare entitlementId: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.CHAR(36)) declare linkId: string | null;
  @Column(DataType.CHAR(64)) declare sha256: string;
  @Column(DataType.STRING(200)) declare fileName: string;
  @Column(DataType.BIGINT.UNSIGNED) declare bytes: number | string;
  @Column(DataType.BOOLEAN) declare isBundle: boolean;
  @MomentColumn() declare grantedAt: Date;
  @Column(DataType.INTEGER.UNSIGNED) declare requests: number;
  @Column(DataType.BIGINT.UNSIGNED) declare bytesSent: number | string;
  @MomentColumn({ isNullable: true }) declare firstRequestAt: Date | null;
  @MomentColumn({ isNullable: true }) declare completedAt: Date | null;
}
