import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';
import { MomentColumn } from '../database/columns.js';

/** A row of the session store. */
@Table({ tableName: 'sessions', timestamps: true, underscored: true, modelName: 'SessionRecord' })
export class SessionRecord extends Model {
  @PrimaryKey @Column(DataType.STRING(64)) declare sid: string;
  @MomentColumn({ isNullable: true }) declare expires: Date | null;
  @Column(DataType.TEXT('medium')) declare data: string | null;
  @Column(DataType.CHAR(36)) declare personId: string | null;
  @Column(DataType.DATE(6)) declare createdAt: Date;
  @Column(DataType.DATE(6)) declare updatedAt: Date;
}
