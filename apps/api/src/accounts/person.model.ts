import type { Role } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

@Table({ tableName: 'people', timestamps: false })
export class Person extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(254)) declare email: string;
  @Column(DataType.STRING(80)) declare name: string;
  @Column(DataType.STRING(255)) declare passphraseHash: string | null;
  @Column(DataType.STRING(20)) declare role: Role;
  @MomentColumn({ isNullable: true }) declare verifiedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
