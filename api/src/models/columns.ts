import { DataTypes, type Model, type ModelAttributeColumnOptions } from 'sequelize';

/** NUMERIC arrives from the driver as text; these columns read and write numbers. */
export function decimalColumn(precision: number, scale: number): ModelAttributeColumnOptions {
  return { type: DataTypes.DECIMAL(precision, scale) };
}

/** Makes the getter that turns a NUMERIC attribute into a number. */
export function decimal(name: string, precision: number, scale: number): ModelAttributeColumnOptions {
  return {
    ...decimalColumn(precision, scale),
    get(this: Model) {
      const value = this.getDataValue(name as never) as unknown;
      return value === null || value === undefined ? null : Number(value);
    },
  };
}

export const id = (): ModelAttributeColumnOptions => ({ type: DataTypes.UUID, primaryKey: true });
export const uuid = (): ModelAttributeColumnOptions => ({ type: DataTypes.UUID });
export const textColumn = (): ModelAttributeColumnOptions => ({ type: DataTypes.TEXT });
export const integer = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER });
export const float = (): ModelAttributeColumnOptions => ({ type: DataTypes.DOUBLE });
export const flag = (): ModelAttributeColumnOptions => ({ type: DataTypes.BOOLEAN });
export const instant = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE });
export const calendarDate = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATEONLY });
export const json = (): ModelAttributeColumnOptions => ({ type: DataTypes.JSONB });
export const textArray = (): ModelAttributeColumnOptions => ({ type: DataTypes.ARRAY(DataTypes.TEXT) });
export const uuidArray = (): ModelAttributeColumnOptions => ({ type: DataTypes.ARRAY(DataTypes.UUID) });
export const versionColumn = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER, defaultValue: 1 });

/** Columns every clinical entry carries: who entered it, its version, and whether it was voided. */
export const entryColumns = () => ({
  recordedBy: uuid(),
  version: versionColumn(),
  voidedAt: instant(),
  voidedBy: uuid(),
  voidReason: textColumn(),
  voidText: textColumn(),
  createdAt: instant(),
  updatedAt: instant(),
});
