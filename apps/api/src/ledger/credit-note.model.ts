import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';
import type { CreditedLine } from './receipt-parties.js';
import type { ReceiptTax } from './receipt.model.js';

/** What corrects a receipt: money that went back. Amounts are above zero and mean less. Seller and buyer are the receipt's. */
@Table({ tableName: 'credit_notes', timestamps: false })
export class CreditNote extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare refundId: string;
  @Column(DataType.CHAR(36)) declare orderId: string;
  @Column(DataType.CHAR(36)) declare receiptId: string;
  @Column(DataType.STRING(20)) declare orderNumber: string;
  @Column(DataType.STRING(20)) declare series: string;
  @Column(DataType.SMALLINT.UNSIGNED) declare year: number;
  @Column(DataType.INTEGER.UNSIGNED) declare number: number;
  @Column(DataType.STRING(30)) declare label: string;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.INTEGER.UNSIGNED) declare totalMinor: number;
  @Column(DataType.CHAR(2)) declare country: string;
  @Column(DataType.JSON) declare tax: ReceiptTax[];
  @Column(DataType.JSON) declare lines: CreditedLine[];
  @Column(DataType.STRING(10)) declare cause: 'refund' | 'dispute';
  @MomentColumn() declare issuedAt: Date;
}
