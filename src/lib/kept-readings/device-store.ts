import { browserStore } from './browser-store.ts'
import type { ReadingStore } from './reading-store.ts'

let opened: Promise<ReadingStore> | undefined
const open = () => (opened ??= browserStore())

/** The browser's store, opened when it is first needed and shared by all sheets of the page. Its promises reject where the browser keeps nothing. */
export const deviceStore: ReadingStore = {
  all: async (testRunId) => (await open()).all(testRunId),
  put: async (items) => (await open()).put(items),
  remove: async (items) => (await open()).remove(items),
}
