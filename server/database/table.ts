import type { Model} from 'sequelize';
import { DataTypes, type ModelAttributes, type ModelStatic } from 'sequelize'
import { v7 } from 'uuid'
import type { Column } from './columns.ts'
import { database } from './connection.ts'

type Columns = Record<string, Column<unknown, boolean>>
type ValueOf<C> = C extends Column<infer T, boolean> ? T : never
type OptionalKeys<C extends Columns> = { [K in keyof C]: C[K] extends Column<unknown, infer O> ? (true extends O ? K : never) : never }[keyof C]

type Own = { id: string; createdAt: Date }
export type RowOf<C extends Columns> = { [K in keyof C]: ValueOf<C[K]> } & Own
export type NewOf<C extends Columns> = { [K in Exclude<keyof C, OptionalKeys<C>>]: ValueOf<C[K]> } & { [K in OptionalKeys<C>]?: ValueOf<C[K]> } & Partial<Own>

export type Table<C extends Columns> = ModelStatic<Model<RowOf<C>, NewOf<C>> & RowOf<C>>
/** The row of a table, plain. */
export type Row<T> = T extends ModelStatic<Model<infer R, infer _N>> ? R : never

/** One table: columns and nothing else. Every row has a uuid v7 made here and the time it was written. */
export function table<C extends Columns>(name: string, tableName: string, columns: C): Table<C> {
  const attributes = Object.fromEntries(Object.entries(columns).map(([key, column]) => [key, column.options]))
  return database.define(name, {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: () => v7() },
    ...attributes,
    createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: () => new Date() },
  } as ModelAttributes, { tableName, underscored: true, timestamps: false }) as unknown as Table<C>
}
