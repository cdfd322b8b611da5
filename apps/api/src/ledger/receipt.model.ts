import type { TaxTreatment } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';
import type { ReceiptBuyer, ReceiptLine, ReceiptSeller } from './receipt-parties.js';

/** A line of a receipt's tax: one rate of one country. */
export interface ReceiptTax {
  readonly country: string;
  readonly ratePercent: string;
  readonly netMinor: number;
  readonly taxMinor: number;
}

/** A receipt holds all that is printed on it, as it was on that day; it is never changed, only corrected. */
@Table({ tableName: 'receipts', timestamps: false })
export class Receipt extends Model {
  @IdColumn() declare id: string;
  /** A receipt is of an order or of one payment of a pledge. */
  @Column(DataType.CHAR(36)) declare orderId: string | null;
  @Column(DataType.CHAR(36)) declare pledgePaymentId: string | null;
  /** What the buyer calls it: the number of the order, or of the pledge. */
  @Column(DataType.STRING(20)) declare orderNumber: string;
  @Column(DataType.STRING(20)) declare series: string;
  @Column(DataType.SMALLINT.UNSIGNED) declare year: number;
  @Column(DataType.INTEGER.UNSIGNED) declare number: number;
  @Column(DataType.STRING(30)) declare label: string;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.INTEGER.UNSIGNED) declare totalMinor: number;
  @Column(DataType.CHAR(2)) declare country: string;
  @Column(DataType.STRING(20)) declare taxTreatment: TaxTreatment;
  @Column(DataType.JSON) declare tax: ReceiptTax[];
  @Column(DataType.JSON) declare buyer: ReceiptBuyer;
  /** Null where it was issued before this was kept. */
  @Column(DataType.JSON) declare seller: ReceiptSeller | null;
  @Column(DataType.JSON) declare lines: ReceiptLine[];
  @MomentColumn() declare issuedAt: Date;
}
