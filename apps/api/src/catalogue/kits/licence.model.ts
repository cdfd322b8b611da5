import type { Licence as LicenceShape } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'licences', timestamps: false })
export class Licence extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.STRING(20)) declare kind: LicenceShape['kind'];
  @Column(DataType.STRING(120)) declare name: string;
  @Column(DataType.TEXT('medium')) declare terms: string;
  @Column(DataType.INTEGER.UNSIGNED) declare priceMinor: number;
  @Column(DataType.INTEGER.UNSIGNED) declare yearlyLimit: number | null;
  @Column(DataType.BOOLEAN) declare isOffered: boolean;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
