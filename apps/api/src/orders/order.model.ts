import type { BusinessBuyer, GiftWish, TaxTreatment } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';
import type { OrderFlag, OrderState, TaxLine } from './order-record.js';

@Table({ tableName: 'orders', timestamps: false })
export class Order extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(20)) declare number: string;
  @Column(DataType.CHAR(36)) declare attempt: string;
  @Column(DataType.CHAR(64)) declare keyHash: string;
  @Column(DataType.CHAR(36)) declare personId: string | null;
  @Column(DataType.STRING(254)) declare email: string;
  @Column(DataType.STRING(10)) declare state: OrderState;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.INTEGER.UNSIGNED) declare subtotalMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare discountMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare totalMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare refundedMinor: number;
  @Column(DataType.CHAR(36)) declare couponId: string | null;
  @Column(DataType.STRING(40)) declare couponCode: string | null;
  @Column(DataType.CHAR(2)) declare declaredCountry: string;
  @Column(DataType.CHAR(2)) declare paymentCountry: string | null;
  @Column(DataType.CHAR(2)) declare cardCountry: string | null;
  /** Where staff settled by hand what the evidence left open. */
  @Column(DataType.CHAR(2)) declare settledCountry: string | null;
  @Column(DataType.JSON) declare flags: OrderFlag[];
  @Column(DataType.TEXT) declare consentText: string;
  @MomentColumn() declare consentAt: Date;
  @Column(DataType.STRING(120)) declare sessionId: string | null;
  @Column(DataType.STRING(120)) declare paymentIntentId: string | null;
  @Column(DataType.TEXT) declare paymentUrl: string | null;
  @MomentColumn({ isNullable: true }) declare payUntil: Date | null;
  @Column(DataType.STRING(30)) declare receiptNumber: string | null;
  @Column(DataType.JSON) declare tax: TaxLine[] | null;
  @Column(DataType.STRING(20)) declare taxTreatment: TaxTreatment;
  @Column(DataType.JSON) declare business: BusinessBuyer | null;
  @Column(DataType.JSON) declare gift: GiftWish | null;
  @MomentColumn({ isNullable: true }) declare paidAt: Date | null;
  @MomentColumn({ isNullable: true }) declare closedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
