import type { ReadingStore } from './reading-store.ts'
import { nameOf, Unsent } from './unsent.ts'

const database = 'crosshead-bench'
const table = 'unsent'

/** The browser's own database; rejects where the browser has none or keeps it shut. What another version left behind in another shape is skipped. */
export async function browserStore(): Promise<ReadingStore> {
  const { openDB } = await import('idb')
  const db = await openDB(database, 1, {
    upgrade: (made) => { made.createObjectStore(table, { keyPath: 'name' }).createIndex('byRun', 'testRunId') },
  })
  return {
    all: async (testRunId) => {
      const rows: unknown[] = await db.getAllFromIndex(table, 'byRun', testRunId)
      return rows.flatMap((row) => Unsent.safeParse(row).data ?? []).sort((a, b) => a.at - b.at)
    },
    put: async (items) => {
      const writing = db.transaction(table, 'readwrite')
      await Promise.all([...items.map((item) => writing.store.put({ ...item, name: nameOf(item) })), writing.done])
    },
    remove: async (items) => {
      const writing = db.transaction(table, 'readwrite')
      await Promise.all([...items.map((item) => writing.store.delete(nameOf(item))), writing.done])
    },
  }
}
