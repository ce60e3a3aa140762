import type { ReadingStore } from './reading-store.ts'
import { nameOf, type Unsent } from './unsent.ts'

/** A store that lasts as long as the page: for browsers that keep nothing, which the sheet says. */
export function memoryStore(): ReadingStore {
  const kept = new Map<string, Unsent>()
  return {
    all: (testRunId) => Promise.resolve([...kept.values()].filter((item) => item.testRunId === testRunId)),
    put: (items) => {
      for (const item of items) kept.set(nameOf(item), item)
      return Promise.resolve()
    },
    remove: (items) => {
      for (const item of items) kept.delete(nameOf(item))
      return Promise.resolve()
    },
  }
}
