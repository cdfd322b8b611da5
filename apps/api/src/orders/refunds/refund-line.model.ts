import { Column, DataType, Model, Table } from 'sequelize-typescript';

/** What of a line goes back with a refund, and whether the right to its files stays all the same. */
@Table({ tableName: 'refund_lines', timestamps: false })
export class RefundLine extends Model {
  @Column({ type: DataType.CHAR(36), primaryKey: true }) declare refundId: string;
  @Column({ type: DataType.CHAR(36), primaryKey: true }) declare orderLineId: string;
  @Column(DataType.INTEGER.UNSIGNED) declare amountMinor: number;
  @Column(DataType.BOOLEAN) declare keepsEntitlement: boolean;
}
