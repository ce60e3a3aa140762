import { useQueryClient } from '@tanstack/react-query'
import { useEffect, useState, useSyncExternalStore } from 'react'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { runQuery, sendReadings } from '../../api/test-runs.ts'
import { deviceStore } from '../../lib/kept-readings/device-store.ts'
import { createReadingQueue, type QueueState, type ReadingQueue } from '../../lib/kept-readings/reading-queue.ts'

/** The queue that brings this run's readings to the server while its sheet is open. The component is keyed by the run. */
export function useReadingQueue(run: TestRun): [ReadingQueue, QueueState] {
  const client = useQueryClient()
  const { queryKey } = runQuery(run.id)
  const [queue] = useState(() => createReadingQueue({
    store: deviceStore, run,
    send: (body) => sendReadings(run.id, body),
    refetch: () => client.fetchQuery({ ...runQuery(run.id), staleTime: 0 }),
    onRun: (fresh) => client.setQueryData(queryKey, (now) => (now && now.version > fresh.version ? now : fresh)),
  }))
  useEffect(() => {
    const again = () => void queue.retry()
    void queue.open()
    window.addEventListener('online', again)
    return () => {
      window.removeEventListener('online', again)
      queue.close()
    }
  }, [queue])
  useEffect(() => void queue.see(run), [queue, run])
  return [queue, useSyncExternalStore(queue.subscribe, queue.state)]
}
