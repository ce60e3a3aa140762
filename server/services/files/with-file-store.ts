import { Problem } from '../../../shared/problems.ts'
import { FileError } from '../../integrations/files/file-error.ts'

/** Works with the file store; what it refuses about a file is told beside the field. */
export async function withFileStore<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (error) {
    if (!(error instanceof FileError)) throw error
    if (error.reason === 'not-found' || error.reason === 'bad-key') throw new Problem('not-found', 'the content of this file is gone')
    throw new Problem(error.reason === 'too-large' ? 'too-large' : 'not-acceptable', error.message, { file: error.message })
  }
}
