import type { BenchAbility } from './bench-hours.ts'

/** Why a bench does not take a step, in words; null when it does. A need that the bench states no limits for is not met. */
export function benchRefuses(does: readonly BenchAbility[], step: { capability: string; needs: Readonly<Record<string, number>> }): string | null {
  const ability = does.find(({ kind }) => kind === step.capability)
  if (!ability) return `does not do ${step.capability}`
  for (const [name, value] of Object.entries(step.needs)) {
    const limits = ability.limits[name]
    if (!limits) return `states no limits for ${name}`
    if (value < limits[0] || value > limits[1]) return `takes ${name} ${limits[0]} to ${limits[1]}, not ${value}`
  }
  return null
}
