import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

@Table({ tableName: 'posts', timestamps: false })
export class Post extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(60)) declare slug: string;
  @Column(DataType.STRING(120)) declare title: string;
  @Column(DataType.STRING(300)) declare lead: string;
  @Column(DataType.TEXT('medium')) declare body: string;
  @Column(DataType.STRING(20)) declare audience: 'everybody' | 'supporters';
  @Column(DataType.STRING(20)) declare state: 'draft' | 'published';
  @Column(DataType.CHAR(36)) declare kitId: string | null;
  @MomentColumn({ isNullable: true }) declare publishedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
