import type { KeepsAfter } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'pledge_plans', timestamps: false })
export class PledgePlan extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(60)) declare name: string;
  @Column(DataType.TEXT) declare words: string;
  @Column(DataType.INTEGER.UNSIGNED) declare amountMinor: number;
  @Column(DataType.CHAR(3)) declare currency: string;
  @Column(DataType.BOOLEAN) declare hasAllKits: boolean;
  @Column(DataType.STRING(20)) declare keepsAfter: KeepsAfter;
  @Column(DataType.BOOLEAN) declare isOffered: boolean;
  /** Goes up whenever the kits change, so that supporters' shelves follow once for each change. */
  @Column(DataType.INTEGER.UNSIGNED) declare kitsVersion: number;
  @Column(DataType.INTEGER.UNSIGNED) declare followedVersion: number;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
