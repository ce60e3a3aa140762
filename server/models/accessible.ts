import { rulesToCondition } from '@casl/ability/extra'
import { Op, type WhereOptions } from 'sequelize'
import type { AppAbility } from '../../shared/access/abilities.ts'
import type { Action, SubjectName } from '../../shared/api/permission.ts'

const operators: Record<string, symbol> = { $eq: Op.eq, $ne: Op.ne, $in: Op.in, $nin: Op.notIn }

/** The rows a person may act on, as a Sequelize condition; null when there are none. */
export function accessibleWhere(ability: AppAbility, action: Action, name: SubjectName): WhereOptions | null {
  return rulesToCondition<AppAbility, WhereOptions, WhereOptions>(
    ability.rulesFor(action, name),
    (rule) => (rule.inverted ? { [Op.not]: toWhere(rule.conditions) } : toWhere(rule.conditions)),
    { and: (all) => ({ [Op.and]: all }), or: (some) => ({ [Op.or]: some }), empty: () => ({}) },
  )
}

function toWhere(conditions: unknown): WhereOptions {
  return Object.fromEntries(Object.entries(conditions as Record<string, unknown>).map(([column, test]) => [column, isPlain(test) ? withSymbols(test) : test]))
}
function withSymbols(test: Record<string, unknown>): object {
  const pairs = Object.entries(test).map(([key, value]): [PropertyKey, unknown] => {
    const operator = operators[key]
    if (!operator) throw new Error(`no SQL for the rule operator ${key}`)
    return [operator, value]
  })
  return Object.fromEntries(pairs)
}
const isPlain = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value)
