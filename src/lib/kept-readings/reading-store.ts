import type { Unsent } from './unsent.ts'

/** Where unsent readings outlive the page. */
export type ReadingStore = {
  /** Everything unsent of a run, in the order it was put. */
  all(testRunId: string): Promise<Unsent[]>
  put(items: readonly Unsent[]): Promise<void>
  remove(items: readonly Pick<Unsent, 'kind' | 'key'>[]): Promise<void>
}
