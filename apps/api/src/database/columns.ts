import { applyDecorators } from '@nestjs/common';
import { Column, DataType, PrimaryKey } from 'sequelize-typescript';
import { v7 as uuid } from 'uuid';

/** Time-ordered ids keep InnoDB's clustered index compact. */
export const newId = (): string => uuid();

/** The primary key of every own table. */
export const IdColumn = (): PropertyDecorator =>
  applyDecorators(
    PrimaryKey as PropertyDecorator,
    Column({ type: DataType.CHAR(36), defaultValue: newId }) as PropertyDecorator,
  );

/** Without a precision MariaDB drops the milliseconds. */
export const MomentColumn = (options: { isNullable?: boolean } = {}): PropertyDecorator =>
  Column({ type: DataType.DATE(6), allowNull: options.isNullable ?? false }) as PropertyDecorator;
