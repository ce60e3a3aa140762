import type { Request, Response } from 'express'
import multer from 'multer'
import { largestFile } from '../../shared/api/files.ts'
import { Problem } from '../../shared/problems.ts'
import { FileError } from '../integrations/files/file-error.ts'
import type { StoredFile } from '../integrations/files/file-store.ts'
import { outside } from '../integrations/outside.ts'

/** Streams the one file of a form into the store; `name` is as it came and never becomes a path. */
export async function receiveUpload(req: Request, res: Response): Promise<StoredFile & { name: string }> {
  const { files } = outside()
  let stored: StoredFile | null = null
  const upload = multer({
    defParamCharset: 'utf8',
    limits: { files: 1, fields: 0, headerPairs: 20 },
    storage: {
      _handleFile(_req, file, done) {
        files.put(file.stream, { maxBytes: largestFile }).then((kept) => { stored = kept; done(null, { size: kept.size }) }, done)
      },
      _removeFile(_req, _file, done) {
        done(null)
      },
    },
  }).single('file')
  try {
    await new Promise<void>((resolve, reject) => void upload(req, res, (error: unknown) => (error ? reject(error instanceof Error ? error : new Error('the upload broke off')) : resolve())))
    if (!stored || !req.file) throw new Problem('not-acceptable', 'no file came along', { file: 'choose a file' })
    return { ...(stored as StoredFile), name: req.file.originalname }
  } catch (error) {
    if (stored) await files.remove((stored as StoredFile).key)
    if (error instanceof FileError && error.reason === 'too-large') throw new Problem('too-large', error.message, { file: error.message })
    throw error
  }
}
