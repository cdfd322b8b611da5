import type { VariantClearance } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn } from '../../database/columns.js';

/** A part in another clearance than its own file's. */
@Table({ tableName: 'part_variants', timestamps: false })
export class PartVariant extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.CHAR(36)) declare partId: string;
  @Column(DataType.STRING(10)) declare clearance: VariantClearance;
  @Column(DataType.CHAR(36)) declare fileId: string;
}
