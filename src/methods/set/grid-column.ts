import type { ReactNode } from 'react'
import type { NumberField } from '../../../shared/method/field.ts'

/** A column of the grid: the field of the method's schema, and how its head says it. */
export type GridColumn = { field: NumberField; head: ReactNode; unit?: string | undefined; decimals?: number }
