import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

export type OneTimePurpose = 'verify' | 'sign-in' | 'reset' | 'invite';

@Table({ tableName: 'one_time_tokens', timestamps: false })
export class OneTimeToken extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare personId: string;
  @Column(DataType.STRING(20)) declare purpose: OneTimePurpose;
  @Column(DataType.CHAR(64)) declare tokenHash: string;
  @MomentColumn() declare expiresAt: Date;
  @MomentColumn({ isNullable: true }) declare usedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
}
