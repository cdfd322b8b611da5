import { Column, type DataType, type Model } from 'sequelize-typescript';

type NumericType = ReturnType<typeof DataType.DECIMAL> | typeof DataType.BIGINT.UNSIGNED;

/** DECIMAL and BIGINT come back from the driver as text; models give them as numbers. */
export const NumberColumn = (name: string, type: NumericType): PropertyDecorator =>
  Column({
    type,
    get(this: Model) {
      const value: unknown = this.getDataValue(name);
      return value === null || value === undefined ? value : Number(value);
    },
  }) as PropertyDecorator;
