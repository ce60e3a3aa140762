import { extensionUnits, forceUnits, timeUnits, type RecordChoices, type TextTable } from '../../../../shared/tensile/record.ts'

export type Columns = Pick<RecordChoices, 'extension' | 'force' | 'time'>

/** Which columns hold time, extension and force, by their names; to be corrected by whoever looks at them. */
export function guessColumns({ names }: Pick<TextTable, 'names'>): Columns {
  const find = (pattern: RegExp, taken: readonly string[] = []) => names.find((name) => pattern.test(name) && !taken.includes(name))
  const time = find(/\b(time|zeit|temps)\b|^t\b|_s$/i)
  const force = find(/force|load|kraft|last|\b(kN|N|lbf)\b/i, time ? [time] : []) ?? ''
  const taken = [force, ...(time ? [time] : [])]
  const extension = find(/exten|dehn|verl/i, taken) ?? find(/strain|displ|weg|position|\b(mm|µm|um)\b/i, taken) ?? ''
  return {
    extension: { column: extension, unit: unitOf(extension, extensionUnits, /%|percent|strain/i.test(extension) ? '% of gauge length' : 'mm') },
    force: { column: force, unit: unitOf(force, forceUnits, 'N') },
    ...(time && { time: { column: time, unit: unitOf(time, timeUnits, 's') } }),
  }
}

/** The unit that a column's name states, as in "Force [kN]" or "force_kN". */
function unitOf<U extends string>(name: string, units: Readonly<Record<U, number>>, usual: U): U {
  const words = name.replace('um', 'µm').split(/[\s_()[\],/]+/)
  return (Object.keys(units) as U[]).find((unit) => words.includes(unit)) ?? usual
}
