import type { letterStates, LetterAudience } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

@Table({ tableName: 'letters', timestamps: false })
export class Letter extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.STRING(20)) declare kind: 'service' | 'news';
  @Column(DataType.STRING(150)) declare subject: string;
  @Column(DataType.TEXT('medium')) declare body: string;
  @Column(DataType.CHAR(36)) declare kitId: string | null;
  @Column(DataType.CHAR(36)) declare revisionId: string | null;
  @Column(DataType.JSON) declare audience: LetterAudience;
  @Column(DataType.BOOLEAN) declare leavesOutUnneeded: boolean;
  @Column(DataType.INTEGER) declare perMinute: number;
  @Column(DataType.STRING(20)) declare state: (typeof letterStates)[number];
  @Column(DataType.STRING(60)) declare slug: string | null;
  /** Counts the times it was set going, so that a job of an earlier time does nothing. */
  @Column(DataType.INTEGER) declare run: number;
  @MomentColumn({ isNullable: true }) declare sendAt: Date | null;
  @MomentColumn({ isNullable: true }) declare startedAt: Date | null;
  @MomentColumn({ isNullable: true }) declare finishedAt: Date | null;
  @Column(DataType.CHAR(36)) declare writtenBy: string;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
