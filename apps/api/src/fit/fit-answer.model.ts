import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

@Table({ tableName: 'fit_answers', timestamps: false })
export class FitAnswer extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare reportId: string;
  @Column(DataType.CHAR(36)) declare authorId: string;
  @Column(DataType.STRING(80)) declare authorName: string;
  @Column(DataType.TEXT) declare text: string;
  @MomentColumn() declare createdAt: Date;
}
