import { AutoIncrement, Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';
import { MomentColumn } from '../database/columns.js';

@Table({ tableName: 'staff_log', timestamps: false })
export class StaffLogEntry extends Model {
  @PrimaryKey @AutoIncrement @Column(DataType.BIGINT.UNSIGNED) declare id: string;
  @MomentColumn() declare at: Date;
  @Column(DataType.CHAR(36)) declare personId: string | null;
  @Column(DataType.STRING(120)) declare who: string;
  @Column(DataType.STRING(120)) declare what: string;
  @Column(DataType.STRING(200)) declare subject: string;
  @Column(DataType.JSON) declare beforeJson: unknown;
  @Column(DataType.JSON) declare afterJson: unknown;
}
