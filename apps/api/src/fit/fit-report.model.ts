import type { FitState, FitVerdict } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';
import type { PictureType } from '../pictures/picture-kind.js';

export type Clearance = 'minus' | 'zero' | 'plus';

@Table({ tableName: 'fit_reports', timestamps: false })
export class FitReport extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.STRING(10)) declare partCode: string;
  @Column(DataType.STRING(120)) declare partName: string;
  @Column(DataType.STRING(10)) declare clearance: Clearance | null;
  @Column(DataType.CHAR(36)) declare personId: string;
  @Column(DataType.STRING(80)) declare printerName: string;
  @Column(DataType.STRING(40)) declare material: string;
  /** Decimals come as text. */
  @Column(DataType.DECIMAL(4, 2)) declare nozzleMm: string | number;
  @Column(DataType.DECIMAL(4, 2)) declare layerMm: string | number;
  @Column(DataType.STRING(20)) declare verdict: FitVerdict;
  @Column(DataType.DECIMAL(5, 2)) declare gapMm: string | number | null;
  @Column(DataType.TEXT) declare words: string;
  @Column(DataType.CHAR(64)) declare pictureSha256: string | null;
  @Column(DataType.STRING(20)) declare pictureType: PictureType | null;
  @Column(DataType.INTEGER.UNSIGNED) declare pictureBytes: number | null;
  @Column(DataType.STRING(10)) declare state: FitState;
  @Column(DataType.CHAR(36)) declare fixedInId: string | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
