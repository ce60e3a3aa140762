import { grainIntercept } from './grain/grain-intercept.ts'
import { rockwell } from './hardness/rockwell.ts'
import type { Method } from './method/method.ts'
import { tensile } from './tensile/tensile.ts'

/** Every test method the product offers. Adding a method means adding one line here. */
export const methods: readonly Method[] = [rockwell, tensile, grainIntercept]

/** The method of this id; undefined when there is none. */
export function methodOf(id: string): Method | undefined {
  return methods.find((method) => method.id === id)
}
