import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

/** A mailed link to the page of an order's files; its token is kept as a hash. */
@Table({ tableName: 'download_links', timestamps: false })
export class DownloadLink extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare orderId: string;
  @Column(DataType.STRING(254)) declare email: string;
  @Column(DataType.CHAR(64)) declare tokenHash: string;
  @MomentColumn() declare expiresAt: Date;
  @Column(DataType.INTEGER.UNSIGNED) declare usesLeft: number;
  @MomentColumn({ isNullable: true }) declare replacedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
}
