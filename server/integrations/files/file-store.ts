import type { Readable } from 'node:stream'

export type StoredFile = {
  /** Made by the store; never a name from outside. */
  key: string
  size: number
  /** Hex, lower case. */
  sha256: string
}

/** Keeps files under names of its own. A key that was returned is on disk; a failed or broken-off `put` leaves nothing. */
export type FileStore = {
  /** Above the limit it throws `FileError` with `too-large`. The limit may be lowered per call, not raised. */
  put: (content: Readable, limit?: { maxBytes: number }) => Promise<StoredFile>
  /** Throws `FileError` with `not-found` before the first byte. */
  open: (key: string) => Promise<Readable>
  /** Removing what is not there is no error. */
  remove: (key: string) => Promise<void>
}
