import { spawn } from 'node:child_process'
import { createHash, randomBytes } from 'node:crypto'
import { mkdtemp, readdir, utimes } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { buffer } from 'node:stream/consumers'
import { pathToFileURL } from 'node:url'
import { describe, expect, it } from 'vitest'
import { createFileStore } from '../../../../server/integrations/files/create-file-store.ts'
import { createFolderStore } from '../../../../server/integrations/files/create-folder-store.ts'

const makeFolder = () => mkdtemp(join(tmpdir(), 'files-'))

async function filesIn(folder: string): Promise<string[]> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true })
  return entries.filter((entry) => entry.isFile()).map((entry) => join(entry.parentPath, entry.name))
}

describe('the folder store', () => {
  it('gives back what was put in, with its size and hash', async () => {
    const folder = await makeFolder()
    const store = createFileStore(pathToFileURL(folder).href)
    const content = randomBytes(3_000_001)
    const stored = await store.put(Readable.from([content.subarray(0, 1_000_000), content.subarray(1_000_000)]))
    expect(stored).toMatchObject({ size: 3_000_001, sha256: createHash('sha256').update(content).digest('hex') })
    expect((await buffer(await store.open(stored.key))).equals(content)).toBe(true)
    await store.remove(stored.key)
    await store.remove(stored.key)
    await expect(store.open(stored.key)).rejects.toMatchObject({ name: 'FileError', reason: 'not-found' })
    expect(await filesIn(folder)).toEqual([])
  })

  it('names every file itself, so that equal files stay apart', async () => {
    const store = createFolderStore({ folder: await makeFolder(), maxBytes: 100 })
    const [first, second] = await Promise.all([store.put(Readable.from([Buffer.from('a')])), store.put(Readable.from([Buffer.from('a')]))])
    expect(first?.key).toMatch(/^[0-9a-f]{2}\/[0-9a-f-]{36}$/)
    expect(first?.key).not.toBe(second?.key)
  })

  it('takes a file at the limit and refuses one byte more, naming the limit and keeping nothing', async () => {
    const folder = await makeFolder()
    const store = createFolderStore({ folder, maxBytes: 2 * 1024 * 1024 })
    await store.remove((await store.put(Readable.from([Buffer.alloc(2 * 1024 * 1024)]))).key)
    const tooLarge = store.put(Readable.from([Buffer.alloc(2 * 1024 * 1024), Buffer.alloc(1)]))
    await expect(tooLarge).rejects.toMatchObject({ reason: 'too-large', message: 'the file is above the limit of 2 MiB' })
    await expect(store.put(Readable.from([Buffer.alloc(11)]), { maxBytes: 10 })).rejects.toThrow('10 bytes')
    await expect(store.put(Readable.from([Buffer.alloc(2 * 1024 * 1024 + 1)]), { maxBytes: 1e9 })).rejects.toThrow('2 MiB')
    expect(await filesIn(folder)).toEqual([])
  })

  it('keeps nothing of an upload that breaks off', async () => {
    const folder = await makeFolder()
    const store = createFolderStore({ folder, maxBytes: 1000 })
    const broken = Readable.from((function* () {
      yield Buffer.from('first half')
      throw new Error('the sender went away')
    })())
    await expect(store.put(broken)).rejects.toThrow('the sender went away')
    expect(await filesIn(folder)).toEqual([])
  })

  it('has no file under a key when its process is killed while writing, and clears the rest away later', async () => {
    const folder = await makeFolder()
    const source = new URL('../../../../server/integrations/files/create-folder-store.ts', import.meta.url)
    const script = `
      import { Readable } from 'node:stream'
      import { createFolderStore } from ${JSON.stringify(source.href)}
      const slow = async function* () { yield Buffer.alloc(200_000); process.stdout.write('written'); await new Promise((resolve) => setTimeout(resolve, 60_000)) }
      await createFolderStore({ folder: ${JSON.stringify(folder)}, maxBytes: 1e9 }).put(Readable.from(slow()))`
    const child = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', script], { stdio: ['ignore', 'pipe', 'inherit'] })
    await new Promise((resolve) => child.stdout.once('data', resolve))
    child.kill('SIGKILL')
    await new Promise((resolve) => child.once('exit', resolve))

    const [left, ...others] = await filesIn(folder)
    expect(others).toEqual([])
    expect(left).toContain(join(folder, 'incoming'))
    await utimes(left ?? '', new Date(0), new Date(0))
    const store = createFolderStore({ folder, maxBytes: 1000 })
    const { key } = await store.put(Readable.from([Buffer.from('next')]))
    expect(await filesIn(folder)).toEqual([join(folder, key)])
  }, 20_000)

  it.each(['../../etc/passwd', '/etc/passwd', 'incoming/0198', '', 'ab/../../x', 'ab/0b6f3c52-1111-4111-8111-111111111111\0'])('refuses %j for a key', async (key) => {
    const store = createFolderStore({ folder: await makeFolder(), maxBytes: 100 })
    await expect(store.open(key)).rejects.toMatchObject({ reason: 'bad-key' })
    await expect(store.remove(key)).rejects.toMatchObject({ reason: 'bad-key' })
  })

  it('says which addresses are supported', () => {
    expect(() => createFileStore('s3://bucket/files')).toThrow('FILES_URL: s3:// is not supported, give a folder as file:///path')
  })
})
