import type { HardwareItem, PrintSpecification, RevisionDetail } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../../database/columns.js';
import { NumberColumn } from '../number-column.js';

export type RevisionState = RevisionDetail['state'];
export type BuildVolume = RevisionDetail['buildVolume'];
export type Room = RevisionDetail['room'];

@Table({ tableName: 'revisions', timestamps: false })
export class Revision extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.INTEGER.UNSIGNED) declare mark: number;
  @Column(DataType.INTEGER.UNSIGNED) declare issue: number;
  @Column(DataType.STRING(20)) declare state: RevisionState;
  @Column(DataType.CHAR(36)) declare basedOnId: string | null;
  @Column(DataType.TEXT('medium')) declare assemblyNotes: string;
  @Column(DataType.TEXT('medium')) declare changeNotes: string;
  @Column(DataType.TEXT('medium')) declare cautions: string;
  @Column(DataType.JSON) declare printSpec: PrintSpecification;
  @Column(DataType.JSON) declare hardware: HardwareItem[];
  @Column(DataType.JSON) declare buildVolume: BuildVolume;
  @NumberColumn('declaredCents', DataType.DECIMAL(6, 2)) declare declaredCents: number;
  @Column(DataType.JSON) declare room: Room;
  @Column(DataType.JSON) declare printEstimate: unknown;
  @Column(DataType.STRING(20)) declare releaseState: RevisionDetail['release']['state'];
  @Column(DataType.TINYINT.UNSIGNED) declare releasePercent: number;
  @MomentColumn({ isNullable: true }) declare releaseAskedAt: Date | null;
  @Column(DataType.TEXT) declare releaseFault: string | null;
  @Column(DataType.CHAR(64)) declare bundleSha256: string | null;
  @NumberColumn('bundleBytes', DataType.BIGINT.UNSIGNED) declare bundleBytes: number | null;
  @MomentColumn({ isNullable: true }) declare releasedAt: Date | null;
  @Column(DataType.CHAR(36)) declare releasedBy: string | null;
  @MomentColumn({ isNullable: true }) declare withdrawnAt: Date | null;
  @Column(DataType.TEXT) declare withdrawnReason: string | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;

  get label(): string {
    return labelOf(this);
  }
}

/** The number of a revision as people say it: mark and issue. */
export const labelOf = ({ mark, issue }: { mark: number; issue: number }): string => `Mk ${mark}.${issue}`;

export const isFinal = ({ state }: { state: RevisionState }): boolean =>
  state === 'released' || state === 'withdrawn';
