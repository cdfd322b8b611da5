import type { FilamentColour } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'kits', timestamps: false })
export class Kit extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(60)) declare slug: string;
  @Column(DataType.STRING(60)) declare name: string;
  @Column(DataType.STRING(200)) declare tagline: string;
  @Column(DataType.TEXT('medium')) declare description: string;
  @Column(DataType.STRING(20)) declare colour: FilamentColour;
  @Column(DataType.BOOLEAN) declare isListed: boolean;
  @Column(DataType.CHAR(36)) declare newestRevisionId: string | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
