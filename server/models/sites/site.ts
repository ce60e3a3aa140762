import { usualHours, type WeekHours } from '../../../shared/planning/bench-hours.ts'
import { fallback, json, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Site = table('Site', 'sites', {
  name: text(), address: text(), timeZone: text(),
  /** When its people work. */
  hours: fallback(json<WeekHours>(), usualHours),
})
export type Site = Row<typeof Site>
