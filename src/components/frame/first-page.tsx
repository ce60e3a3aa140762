import { useSuspenseQuery } from '@tanstack/react-query'
import { Navigate } from 'react-router-dom'
import { sessionQuery } from '../../api/session.ts'
import { pagesFor } from './pages-for.ts'

/** Where a person begins: the first page of the role. */
export function FirstPage() {
  const { data: { me } } = useSuspenseQuery(sessionQuery)
  return <Navigate to={me ? pagesFor(me)[0]!.to : '/sign-in'} replace />
}
