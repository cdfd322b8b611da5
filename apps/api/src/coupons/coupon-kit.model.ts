import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A kit a coupon is for; a coupon without any is for all kits. */
@Table({ tableName: 'coupon_kits', timestamps: false })
export class CouponKit extends Model {
  @PrimaryKey @Column(DataType.CHAR(36)) declare couponId: string;
  @PrimaryKey @Column(DataType.CHAR(36)) declare kitId: string;
}
