import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';
import type { TaxLine } from './pledge-record.js';

/** One month that was paid. */
@Table({ tableName: 'pledge_payments', timestamps: false })
export class PledgePayment extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare pledgeId: string;
  @Column(DataType.CHAR(36)) declare planId: string;
  @Column(DataType.STRING(120)) declare invoiceId: string;
  @Column(DataType.STRING(120)) declare paymentIntentId: string | null;
  @Column(DataType.INTEGER.UNSIGNED) declare amountMinor: number;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.CHAR(2)) declare country: string;
  @MomentColumn() declare periodStart: Date;
  @MomentColumn() declare periodEnd: Date;
  @MomentColumn() declare paidAt: Date;
  @Column(DataType.STRING(30)) declare receiptNumber: string | null;
  @Column(DataType.JSON) declare tax: TaxLine[] | null;
  @Column(DataType.STRING(20)) declare disputeState: 'open' | 'lost' | null;
  @MomentColumn() declare createdAt: Date;
}
