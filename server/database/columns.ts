import { DataTypes, type ModelAttributeColumnOptions } from 'sequelize'

/** A column: how the database keeps it, and what TypeScript sees. `O` is true where a new row may leave it out. */
export type Column<T, O extends boolean = false> = { options: ModelAttributeColumnOptions; type?: T; optional?: O }

const required = <T>(options: ModelAttributeColumnOptions): Column<T> => ({ options: { ...options, allowNull: false } })

export const ref = (): Column<string> => required({ type: DataTypes.UUID })
export const text = <T extends string = string>(): Column<T> => required({ type: DataTypes.TEXT })
export const integer = (): Column<number> => required({ type: DataTypes.INTEGER })
/** Whole numbers past 32 bits; they stay below 2^53. */
export const big = (): Column<number> => required({ type: DataTypes.BIGINT })
export const real = (): Column<number> => required({ type: DataTypes.DOUBLE })
export const flag = (): Column<boolean> => required({ type: DataTypes.BOOLEAN })
export const instant = (): Column<Date> => required({ type: DataTypes.DATE })
/** A calendar day, as ISO text. */
export const day = (): Column<string> => required({ type: DataTypes.DATEONLY })
export const json = <T>(): Column<T> => required({ type: DataTypes.JSONB })

/** May be NULL. */
export const maybe = <T>(column: Column<T>): Column<T | null, true> => ({ options: { ...column.options, allowNull: true } })
/** Has a value of its own when a new row leaves it out. */
export const fallback = <T>(column: Column<T>, value: T): Column<T, true> => ({ options: { ...column.options, defaultValue: value } })
