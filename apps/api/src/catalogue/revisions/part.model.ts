import type { Part as PartShape, PrintSpecification, VoiceWithNote } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

export type ReprintMark = 'reprint needed' | 'reprint if it troubles you';

@Table({ tableName: 'parts', timestamps: false })
export class Part extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.CHAR(36)) declare fileId: string | null;
  @Column(DataType.STRING(10)) declare code: string;
  @Column(DataType.STRING(120)) declare name: string;
  @Column(DataType.INTEGER.UNSIGNED) declare quantity: number;
  @Column(DataType.STRING(20)) declare orientation: PartShape['orientation'];
  @Column(DataType.JSON) declare printSpec: PrintSpecification | null;
  @Column(DataType.JSON) declare voice: VoiceWithNote | null;
  @Column(DataType.BOOLEAN) declare isGauge: boolean;
  @Column(DataType.STRING(40)) declare reprintMark: ReprintMark | null;
  @Column(DataType.STRING(300)) declare reprintReason: string;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
