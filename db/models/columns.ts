import { DataTypes, type ModelAttributeColumnOptions } from 'sequelize';
import { v7 } from 'uuid';

/** Ids rise with time, so that rows lie in the order they were made. */
export const id = {
  type: DataTypes.STRING,
  primaryKey: true,
  defaultValue: () => v7(),
} satisfies ModelAttributeColumnOptions;

export const text = { type: DataTypes.TEXT, allowNull: false } satisfies ModelAttributeColumnOptions;
export const optionalText = { type: DataTypes.TEXT, allowNull: true } satisfies ModelAttributeColumnOptions;
export const flag = {
  type: DataTypes.BOOLEAN,
  allowNull: false,
  defaultValue: false,
} satisfies ModelAttributeColumnOptions;

/** `createdAt` and `updatedAt` as ISO 8601 text in UTC; `now` is asked when a row is saved. */
export const times = (now: () => string) => ({
  createdAt: { type: DataTypes.TEXT, allowNull: false, defaultValue: now },
  updatedAt: { type: DataTypes.TEXT, allowNull: false, defaultValue: now },
});
