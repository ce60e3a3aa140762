import { fileURLToPath } from 'node:url'
import { createFolderStore } from './create-folder-store.ts'
import type { FileStore } from './file-store.ts'

export const fileMaxBytes = 50 * 1024 * 1024

/** The file store that `FILES_URL` names. Folders only: S3 needs its SDK, which is not among the dependencies. */
export function createFileStore(filesUrl: string, maxBytes = fileMaxBytes): FileStore {
  const url = new URL(filesUrl)
  if (url.protocol !== 'file:') throw new Error(`FILES_URL: ${url.protocol}// is not supported, give a folder as file:///path`)
  return createFolderStore({ folder: fileURLToPath(url), maxBytes })
}
