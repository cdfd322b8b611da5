import type { Comparison as MeshComparison } from '@windchest/meshes';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'mesh_comparisons', timestamps: false })
export class MeshComparisonRecord extends Model {
  @Column({ type: DataType.CHAR(64), primaryKey: true }) declare beforeSha: string;
  @Column({ type: DataType.CHAR(64), primaryKey: true }) declare afterSha: string;
  @Column(DataType.INTEGER.UNSIGNED) declare comparatorVersion: number;
  @Column(DataType.STRING(20)) declare state: 'waiting' | 'comparing' | 'compared' | 'failed';
  @Column(DataType.INTEGER.UNSIGNED) declare tries: number;
  @Column(DataType.JSON) declare result: MeshComparison | null;
  @Column(DataType.STRING(60)) declare faultCode: string | null;
  /** Why nothing came of it, as half a sentence: "they have …". */
  @Column(DataType.TEXT) declare fault: string | null;
  @MomentColumn({ isNullable: true }) declare comparedAt: Date | null;
  @MomentColumn() declare createdAt: Date;
}
