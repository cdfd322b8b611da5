import type { Gate } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'gate_waivers', timestamps: false })
export class GateWaiver extends Model {
  @Column({ type: DataType.CHAR(36), primaryKey: true }) declare revisionId: string;
  @Column({ type: DataType.STRING(40), primaryKey: true }) declare gate: Gate['name'];
  @Column(DataType.STRING(500)) declare reason: string;
  /** What the gate said then: a waiver covers that, and nothing that comes later. */
  @Column(DataType.TEXT) declare waivedAgainst: string;
  @Column(DataType.CHAR(36)) declare waivedBy: string;
  @Column(DataType.STRING(80)) declare waivedByName: string;
  @MomentColumn() declare waivedAt: Date;
}
