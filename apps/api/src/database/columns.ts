import { Column, DataType } from 'sequelize-typescript';
import { v7 as uuid } from 'uuid';

/** Time-ordered ids keep InnoDB's clustered index compact. */
export const newId = (): string => uuid();

/** The primary key of every own table. */
export const IdColumn = (): PropertyDecorator =>
  Column({ type: DataType.CHAR(36), primaryKey: true, defaultValue: newId }) as PropertyDecorator;

/** Without a precision MariaDB drops the milliseconds. */
export const MomentColumn = (options: { isNullable?: boolean } = {}): PropertyDecorator =>
  Column({ type: DataType.DATE(6), allowNull: options.isNullable ?? false }) as PropertyDecorator;
