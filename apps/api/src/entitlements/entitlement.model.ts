import type { Clearance } from '@windchest/contracts';
import { Column, DataType, Model, Table } from 'sequelize-typescript';
import { IdColumn, MomentColumn } from '../database/columns.js';

export type EntitlementSource = 'purchase' | 'pledge' | 'gift' | 'staff';
export type EntitlementState = 'active' | 'suspended' | 'ended';

/** A person's right to a kit's files. Bought without an account it stands under the address alone. */
@Table({ tableName: 'entitlements', timestamps: false })
export class Entitlement extends Model {
  @IdColumn() declare id: string;
  @Column(DataType.CHAR(36)) declare personId: string | null;
  @Column(DataType.STRING(254)) declare email: string;
  @Column(DataType.CHAR(36)) declare kitId: string;
  @Column(DataType.CHAR(36)) declare licenceId: string | null;
  @Column(DataType.STRING(20)) declare source: EntitlementSource;
  @Column(DataType.CHAR(36)) declare orderId: string | null;
  @Column(DataType.CHAR(36)) declare orderLineId: string | null;
  @Column(DataType.CHAR(36)) declare pledgeId: string | null;
  @Column(DataType.STRING(20)) declare state: EntitlementState;
  @Column(DataType.CHAR(36)) declare heldRevisionId: string | null;
  @MomentColumn({ isNullable: true }) declare heldSince: Date | null;
  /** What its owner prints of this kit, once they have said or shown it. */
  @Column(DataType.STRING(10)) declare clearance: Clearance | null;
  /** Bounds by the moment of release, after a pledge; none while it is paid, or for what was bought. */
  @MomentColumn({ isNullable: true }) declare releasedFrom: Date | null;
  @MomentColumn({ isNullable: true }) declare releasedBefore: Date | null;
  /** How far the pledge behind it is paid, to say so; the pledge itself ends it. */
  @MomentColumn({ isNullable: true }) declare untilAt: Date | null;
  @MomentColumn() declare createdAt: Date;
  @MomentColumn() declare updatedAt: Date;
  @MomentColumn({ isNullable: true }) declare endedAt: Date | null;
}
