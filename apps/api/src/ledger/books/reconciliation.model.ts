import type { Reconciliation as Shown } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

/** A comparison of a span of days with the payment service, both days included. */
@Table({ tableName: 'reconciliations', timestamps: false })
export class Reconciliation extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.DATEONLY) declare fromDay: string;
  @Column(DataType.DATEONLY) declare toDay: string;
  @Column(DataType.STRING(10)) declare state: Shown['state'];
  @Column(DataType.TINYINT.UNSIGNED) declare percent: number;
  @Column(DataType.JSON) declare sums: Shown['sums'];
  @Column(DataType.INTEGER.UNSIGNED) declare differences: number | null;
  @Column(DataType.STRING(500)) declare fault: string | null;
  @Column(DataType.STRING(200)) declare askedBy: string;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn({ isNullable: true }) declare finishedAt: Date | null;
}
