/**
 * - `too-large`: above the limit in bytes; nothing was kept
 * - `not-found`: no file under this key
 * - `bad-key`: not a key that `put` ever gave
 * - `not-allowed`: a type of file that is not accepted, or a name that disagrees with the content
 * - `bad-picture`: damaged, or above the limit in pixels
 */
export type FileErrorReason = 'too-large' | 'not-found' | 'bad-key' | 'not-allowed' | 'bad-picture'

export class FileError extends Error {
  readonly reason: FileErrorReason

  constructor(reason: FileErrorReason, message: string, options?: ErrorOptions) {
    super(message, options)
    this.name = 'FileError'
    this.reason = reason
  }
}
