import { createHash, randomUUID } from 'node:crypto'
import { mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { Transform } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { FileError } from './file-error.ts'
import type { FileStore } from './file-store.ts'
import { formatBytes } from './format-bytes.ts'

export type FolderStoreOptions = {
  folder: string
  maxBytes: number
}

const keyShape = /^[0-9a-f]{2}\/[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/
// An upload takes minutes at most; what is older was left by a process that died.
const abandonedAfterMs = 24 * 60 * 60 * 1000

/** The file store in a folder. A file appears under its key only when all of it is on disk: written aside, synced, renamed. */
export function createFolderStore({ folder, maxBytes }: FolderStoreOptions): FileStore {
  const incoming = join(folder, 'incoming')
  let prepared: Promise<void> | undefined
  const prepare = async () => {
    await mkdir(incoming, { recursive: true, mode: 0o700 })
    await removeAbandoned(incoming)
  }

  return {
    async put(content, limit) {
      await (prepared ??= prepare())
      const most = Math.min(maxBytes, limit?.maxBytes ?? maxBytes)
      const id = randomUUID()
      const key = `${id.slice(0, 2)}/${id}`
      const aside = join(incoming, id)
      const meter = measure(most)
      try {
        const file = await open(aside, 'wx', 0o600)
        // `flush` syncs the content before the stream closes the file.
        await pipeline(content, meter.stream, file.createWriteStream({ flush: true }))
        await mkdir(join(folder, id.slice(0, 2)), { recursive: true, mode: 0o700 })
        await rename(aside, join(folder, key))
        await syncFolder(join(folder, id.slice(0, 2)))
        await syncFolder(folder)
      } catch (error) {
        await rm(aside, { force: true })
        throw error
      }
      return { key, ...meter.result() }
    },

    async open(key) {
      const path = pathOf(folder, key)
      try {
        const file = await open(path, 'r')
        return file.createReadStream()
      } catch (error) {
        if (isMissing(error)) throw new FileError('not-found', `no file ${key}`, { cause: error })
        throw error
      }
    },

    async remove(key) {
      await rm(pathOf(folder, key), { force: true })
    },
  }
}

function pathOf(folder: string, key: string): string {
  if (!keyShape.test(key)) throw new FileError('bad-key', `${JSON.stringify(key.slice(0, 80))} is not a key of this store`)
  return join(folder, key)
}

function measure(maxBytes: number) {
  const hash = createHash('sha256')
  let size = 0
  const stream = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      size += chunk.length
      if (size > maxBytes) return done(new FileError('too-large', `the file is above the limit of ${formatBytes(maxBytes)}`))
      hash.update(chunk)
      done(null, chunk)
    },
  })
  return { stream, result: () => ({ size, sha256: hash.digest('hex') }) }
}

/** A rename is on disk only when its folder is. */
async function syncFolder(path: string): Promise<void> {
  const handle = await open(path, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

async function removeAbandoned(incoming: string): Promise<void> {
  for (const name of await readdir(incoming)) {
    const path = join(incoming, name)
    const found = await stat(path).catch(() => null)
    if (found && Date.now() - found.mtimeMs > abandonedAfterMs) await rm(path, { force: true })
  }
}

function isMissing(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ENOENT'
}
