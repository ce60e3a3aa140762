import { Suspense } from 'react'
import { Outlet } from 'react-router-dom'
import { ToastRegion } from '../ui/feedback/toast-region.tsx'

/** Round every page, signed in or not: the place for news, and quiet until the first page is there. */
export function AroundAll() {
  return (
    <ToastRegion>
      <Suspense fallback={null}>
        <Outlet />
      </Suspense>
    </ToastRegion>
  )
}
