import type { PrinterCard } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

@Table({ tableName: 'printer_cards', timestamps: false })
export class PrinterCardRecord extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare personId: string;
  @Column(DataType.STRING(60)) declare name: string;
  @Column({ type: DataType.DOUBLE, field: 'bed_x_mm' }) declare bedXMm: number;
  @Column({ type: DataType.DOUBLE, field: 'bed_y_mm' }) declare bedYMm: number;
  @Column({ type: DataType.DOUBLE, field: 'bed_z_mm' }) declare bedZMm: number;
  @Column(DataType.DOUBLE) declare nozzleMm: number;
  @Column(DataType.JSON) declare materials: PrinterCard['materials'];
  @Column(DataType.STRING(10)) declare clearance: PrinterCard['clearance'];
  @Column(DataType.BOOLEAN) declare isMain: boolean;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
}
