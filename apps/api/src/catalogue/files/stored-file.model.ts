import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { MomentColumn } from '../../database/columns.js';
import { NumberColumn } from '../number-column.js';
import type { FileKind } from './file-kind.js';

/** Contents by their SHA-256, kept once however many revisions use them. */
@Table({ tableName: 'stored_files', timestamps: false })
export class StoredFile extends Model {
  @Column({ type: DataType.CHAR(64), primaryKey: true }) declare sha256: string;
  @NumberColumn('bytes', DataType.BIGINT.UNSIGNED) declare bytes: number;
  @Column(DataType.STRING(10)) declare kind: FileKind;
  @MomentColumn() declare createdAt: Date;
}
