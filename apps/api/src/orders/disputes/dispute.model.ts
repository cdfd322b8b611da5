import type { Dispute as DisputeAnswer } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

export type DisputeStand = DisputeAnswer['state'];

@Table({ tableName: 'disputes', timestamps: false })
export class Dispute extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare orderId: string;
  @Column(DataType.STRING(120)) declare serviceId: string;
  @Column(DataType.STRING(10)) declare state: DisputeStand;
  @Column(DataType.INTEGER.UNSIGNED) declare amountMinor: number;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.STRING(80)) declare reason: string;
  @MomentColumn({ isNullable: true }) declare answerBy: Date | null;
  @MomentColumn() declare openedAt: Date;
  @MomentColumn({ isNullable: true }) declare closedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
