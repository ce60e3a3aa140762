import * as z from 'zod'
import { delimiters } from './read-table.ts'

const Choice = z.object({ column: z.string(), unit: z.string() })
const Remembered = z.object({ delimiter: z.enum(delimiters), headingRows: z.int().min(0).max(200), decimal: z.enum(['.', ',']), extension: Choice, force: Choice, time: Choice.optional() })
export type Remembered = z.infer<typeof Remembered>

const place = (benchId: string) => `crosshead.record.${benchId}`

/** How the records of this bench's frame were read the last time; null the first time. */
export function rememberedChoices(benchId: string): Remembered | null {
  try {
    return Remembered.safeParse(JSON.parse(localStorage.getItem(place(benchId)) ?? 'null')).data ?? null
  } catch {
    return null
  }
}

export function rememberChoices(benchId: string, choices: Remembered): void {
  try {
    localStorage.setItem(place(benchId), JSON.stringify(choices))
  } catch {
    // a browser that keeps nothing finds them again the next time
  }
}
