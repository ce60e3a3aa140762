import { Readable } from 'node:stream'
import { buffer } from 'node:stream/consumers'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { contentType } from '../../integrations/files/content-type.ts'
import { displayImage } from '../../integrations/files/display-image.ts'
import type { StoredFile } from '../../integrations/files/file-store.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { withFileStore } from './with-file-store.ts'

/** Brings the file in; called only once it is known that the caller may add it. */
export type Receive = () => Promise<StoredFile & { name: string }>
/** What the file belongs to, as found when it is kept. */
export type Belonging = Pick<File, 'jobId' | 'customerId' | 'siteId' | 'purpose' | 'visibleToCustomer'> & { sampleId?: string | null; testRunId?: string | null }

const mostFiles = 200

/**
 * Receives a file, tells its type by content, makes a picture's copy for display, and keeps it where `belong` says; that is asked again in
 * the transaction, since an upload takes time. Whatever is refused leaves nothing behind.
 */
export async function keepUpload(receive: Receive, belong: (tx: Tx) => Promise<Belonging>, caller: Caller, { onlyPictures = false } = {}): Promise<File> {
  const { files } = outside()
  const upload = await receive()
  const keys = [upload.key]
  try {
    const name = plainName(upload.name)
    const mediaType = await withFileStore(() => contentType(() => files.open(upload.key), name))
    if (onlyPictures && !mediaType.startsWith('image/')) throw new Problem('not-acceptable', 'a photo is a PNG, JPEG or TIFF picture', { file: 'choose a picture' })
    const displayKey = mediaType.startsWith('image/') ? await withFileStore(() => displayCopy(upload.key)) : null
    if (displayKey) keys.push(displayKey)
    return await inTransaction(caller, async (tx) => {
      const to = await belong(tx)
      if ((await File.count({ where: { jobId: to.jobId, removedAt: null }, transaction: tx })) >= mostFiles) throw new Problem('not-now', `a job holds at most ${mostFiles} files`)
      const { size, sha256, key: storeKey } = upload
      const file = await File.create({ ...to, name, mediaType, size, sha256, storeKey, displayKey, byId: caller.person.id }, { transaction: tx })
      const touches = [{ subject: 'Job' as const, id: to.jobId }, ...(to.sampleId ? [{ subject: 'Sample' as const, id: to.sampleId }] : []), ...(to.testRunId ? [{ subject: 'TestRun' as const, id: to.testRunId }] : [])]
      tx.record({ type: 'file.added', id: file.id, jobId: to.jobId, customerId: to.visibleToCustomer ? to.customerId : null, siteId: to.siteId, data: { name, size, sha256, purpose: to.purpose, text: name }, touches })
      return file.get({ plain: true })
    })
  } catch (error) {
    await Promise.allSettled(keys.map((key) => files.remove(key)))
    throw error
  }
}

async function displayCopy(key: string): Promise<string> {
  const { files } = outside()
  const { content } = await displayImage(await buffer(await files.open(key)))
  return (await files.put(Readable.from(content, { objectMode: false }))).key
}

/** The last part of a path, without characters that no file name needs, at most 150 long with its extension kept. */
function plainName(name: string): string {
  const last = (name.split(/[\\/]/).at(-1) ?? '').replace(/[\p{Cc}\p{Cf}<>:"|?*]/gu, '').trim()
  const dot = last.lastIndexOf('.')
  const [stem, extension] = dot < 0 ? [last, ''] : [last.slice(0, dot), last.slice(dot)]
  return `${stem.slice(0, 150 - Math.min(extension.length, 10)) || 'file'}${extension.slice(0, 10)}`
}
