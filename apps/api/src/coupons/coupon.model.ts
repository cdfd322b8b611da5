import type { CouponOff } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

/** `held` and `redeemed` are changed by conditional updates alone, never through the model. */
@Table({ tableName: 'coupons', timestamps: false })
export class Coupon extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(40)) declare code: string;
  @Column(DataType.STRING(80)) declare label: string;
  @Column(DataType.JSON) declare off: CouponOff;
  @MomentColumn({ isNullable: true }) declare startsAt: Date | null;
  @MomentColumn({ isNullable: true }) declare endsAt: Date | null;
  @Column(DataType.INTEGER.UNSIGNED) declare cap: number | null;
  @Column(DataType.INTEGER.UNSIGNED) declare perBuyer: number | null;
  @Column(DataType.BOOLEAN) declare isForSupporters: boolean;
  @Column(DataType.INTEGER.UNSIGNED) declare minBasketMinor: number | null;
  @Column(DataType.BOOLEAN) declare isAnnounced: boolean;
  @Column(DataType.BOOLEAN) declare isActive: boolean;
  @Column(DataType.INTEGER.UNSIGNED) declare held: number;
  @Column(DataType.INTEGER.UNSIGNED) declare redeemed: number;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
