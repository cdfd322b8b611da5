import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

@Table({ tableName: 'pledge_plan_kits', timestamps: false })
export class PledgePlanKit extends Model {
  @PrimaryKey @Column(DataType.CHAR(36)) declare planId: string;
  @PrimaryKey @Column(DataType.CHAR(36)) declare kitId: string;
}
