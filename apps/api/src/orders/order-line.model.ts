import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn } from '../database/columns.js';

/** Names and the revision's label are kept as they were at the purchase. */
@Table({ tableName: 'order_lines', timestamps: false })
export class OrderLine extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare orderId: string;
  @Column(DataType.INTEGER.UNSIGNED) declare position: number;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.CHAR(36)) declare licenceId: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.STRING(60)) declare kitName: string;
  @Column(DataType.STRING(120)) declare licenceName: string;
  @Column(DataType.STRING(20)) declare revisionLabel: string;
  @Column(DataType.INTEGER.UNSIGNED) declare priceMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare discountMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare totalMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare refundedMinor: number;
}
