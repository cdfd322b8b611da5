import type { WorkshopRefund } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'refunds', timestamps: false })
export class Refund extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare orderId: string;
  @Column(DataType.CHAR(36)) declare attempt: string | null;
  @Column(DataType.STRING(10)) declare origin: WorkshopRefund['origin'];
  @Column(DataType.STRING(10)) declare state: WorkshopRefund['state'];
  @Column(DataType.INTEGER.UNSIGNED) declare amountMinor: number;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.STRING(300)) declare reason: string;
  @Column(DataType.STRING(200)) declare askedBy: string | null;
  /** The payment service's own id of it; of a dispute's loss, the dispute's. */
  @Column(DataType.STRING(120)) declare serviceId: string | null;
  @Column(DataType.STRING(500)) declare fault: string | null;
  @Column(DataType.CHAR(36)) declare creditNoteId: string | null;
  @Column(DataType.STRING(30)) declare creditNoteNumber: string | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
  @MomentColumn({ isNullable: true }) declare settledAt: Date | null;
}
