type Base = { name: string; label: string; optional: boolean; help?: string; initial?: unknown }

/** Bounds of a number; the exclusive ones are not allowed themselves. */
export type NumberLimits = { minimum?: number; exclusiveMinimum?: number; maximum?: number; exclusiveMaximum?: number; whole: boolean; step?: number; unit?: string }
export type NumberField = Base & NumberLimits & { kind: 'number' }
export type TextField = Base & { kind: 'text'; longest?: number }
export type BooleanField = Base & { kind: 'boolean' }
export type ChoiceField = Base & { kind: 'choice'; options: { value: string | number; label: string }[] }
/** A list of numbers: repeated measurements, or a column of a record. */
export type NumbersField = Base & NumberLimits & { kind: 'numbers'; fewest: number; most?: number }
/** Rows of the same columns. */
export type TableField = Base & { kind: 'table'; columns: Field[]; fewest: number; most?: number }
/** Fields that belong together under one label. */
export type GroupField = Base & { kind: 'group'; fields: Field[] }
/** A choice that decides which fields follow; `key` holds the choice inside the value. */
export type VariantsField = Base & { kind: 'variants'; key: string; options: { value: string; label: string; fields: Field[] }[] }

/** One thing to fill in: plain data, drawn by any screen. */
export type Field = NumberField | TextField | BooleanField | ChoiceField | NumbersField | TableField | GroupField | VariantsField
