import { lazy } from 'react'
import type { Method } from '../../shared/method/method.ts'
import { NamedView } from './named/named-view.tsx'
import { AnySetView } from './set/set-form-view.tsx'
import type { SheetView } from './sheet-view.ts'

/** Methods that have a better sheet than the generic one; the only place of the screens that names methods. */
const views: Readonly<Record<string, SheetView>> = {
  'rockwell': lazy(() => import('./rockwell/rockwell-view.tsx').then(({ RockwellView }) => ({ default: RockwellView }))),
  'tensile': lazy(() => import('./tensile/tensile-view.tsx').then(({ TensileView }) => ({ default: TensileView }))),
  'grain-intercept': lazy(() => import('./grain/grain-intercept-view.tsx').then(({ GrainInterceptView }) => ({ default: GrainInterceptView }))),
}

/** The sheet of a method: its own, or one drawn from its schemas. */
export function viewOf(method: Pick<Method, 'id' | 'isSet'>): SheetView {
  return views[method.id] ?? (method.isSet ? AnySetView : NamedView)
}
