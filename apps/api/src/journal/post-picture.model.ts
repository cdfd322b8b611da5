import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';
import type { PictureType } from '../pictures/picture-kind.js';

@Table({ tableName: 'post_pictures', timestamps: false })
export class PostPicture extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare postId: string;
  @Column(DataType.CHAR(64)) declare sha256: string;
  @Column(DataType.STRING(20)) declare contentType: PictureType;
  @Column(DataType.STRING(200)) declare fileName: string;
  @Column(DataType.INTEGER.UNSIGNED) declare bytes: number;
  @MomentColumn() declare createdAt: Date;
}
