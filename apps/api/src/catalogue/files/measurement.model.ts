import type { PrintProfile } from '@windchest/plates';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { MomentColumn } from '../../database/columns.js';
import type { Drawings, MeasuredMesh } from './measured-mesh.js';

@Table({ tableName: 'measurements', timestamps: false })
export class MeasurementRecord extends Model {
  @Column({ type: DataType.CHAR(64), primaryKey: true }) declare sha256: string;
  @Column(DataType.STRING(20)) declare state: 'waiting' | 'measuring' | 'measured' | 'refused';
  @Column(DataType.INTEGER.UNSIGNED) declare measurerVersion: number;
  @Column(DataType.INTEGER.UNSIGNED) declare tries: number;
  @Column(DataType.JSON) declare measurement: MeasuredMesh | null;
  @Column(DataType.STRING(128)) declare geometryHash: string | null;
  @Column(DataType.JSON) declare drawings: Drawings | null;
  @Column(DataType.JSON) declare printProfile: PrintProfile | null;
  @Column(DataType.JSON) declare footprint: readonly (readonly [number, number])[] | null;
  @Column(DataType.CHAR(64)) declare previewSha256: string | null;
  @Column(DataType.STRING(60)) declare faultCode: string | null;
  /** What is wrong, without the file's name: the same bytes may have several. */
  @Column(DataType.TEXT) declare fault: string | null;
  @MomentColumn({ isNullable: true }) declare measuredAt: Date | null;
  @MomentColumn() declare createdAt: Date;
}
