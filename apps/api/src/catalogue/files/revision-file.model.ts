import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';

/** A stored file under a name in one revision. */
@Table({ tableName: 'revision_files', timestamps: false })
export class RevisionFile extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare revisionId: string;
  @Column(DataType.CHAR(64)) declare sha256: string;
  @Column(DataType.STRING(200)) declare fileName: string;
  @MomentColumn() declare createdAt: Date;
}
