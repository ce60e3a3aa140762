import { Readable } from 'node:stream'
import { fileTypeFromStream } from 'file-type/node'
import { FileError } from './file-error.ts'

const contentTypes = [
  'application/pdf',
  'image/png',
  'image/jpeg',
  'image/tiff',
  'text/csv',
  'text/plain',
  'application/vnd.openxmlformats-officedocument.wordprocessingml.document',
  'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
] as const

export type ContentType = (typeof contentTypes)[number]

/** Every type of file that is accepted, with the extensions that may stand in its name. */
export const acceptedExtensions: Record<ContentType, readonly string[]> = {
  'application/pdf': ['pdf'],
  'image/png': ['png'],
  'image/jpeg': ['jpg', 'jpeg'],
  'image/tiff': ['tif', 'tiff'],
  'text/csv': ['csv'],
  'text/plain': ['txt', 'asc', 'dat', 'tsv'],
  'application/vnd.openxmlformats-officedocument.wordprocessingml.document': ['docx'],
  'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet': ['xlsx'],
}

/**
 * The type of a file by its content. Its extension has to agree; where content alone cannot tell (plain text or CSV) the extension decides
 * between those two, after all of the file was found to be text.
 * @param open gives the content from its start; may be asked twice
 * @throws FileError `not-allowed`
 */
export async function contentType(open: () => Promise<Readable>, name: string): Promise<ContentType> {
  const extension = /\.([a-z0-9]{1,5})$/i.exec(name)?.[1]?.toLowerCase() ?? ''
  const byName = contentTypes.find((type) => acceptedExtensions[type].includes(extension))
  if (!byName) throw new FileError('not-allowed', `a file ${extension ? `ending in .${extension}` : 'without an extension'} is not accepted; accepted are ${acceptedList()}`)

  const found = await detect(open)
  if (found === undefined) {
    if (byName.startsWith('text/') && (await isText(open))) return byName
    throw new FileError('not-allowed', `the content is not what .${extension} says; accepted are ${acceptedList()}`)
  }
  const byContent = contentTypes.find((type) => type === found)
  if (!byContent) throw new FileError('not-allowed', `the content is ${found}, which is not accepted; accepted are ${acceptedList()}`)
  if (byContent !== byName) throw new FileError('not-allowed', `the content is ${byContent}, but the name ends in .${extension}`)
  return byContent
}

function acceptedList(): string {
  return Object.values(acceptedExtensions).flat().join(', ')
}

async function detect(open: () => Promise<Readable>): Promise<string | undefined> {
  // The detector finds nothing at all in a stream of objects, so the bytes are handed on as bytes.
  const content = Readable.from(bytesOf(await open()), { objectMode: false })
  try {
    return (await fileTypeFromStream(content))?.mime
  } finally {
    content.destroy()
  }
}

/** No control characters but tab, line feed, form feed and return: true of UTF-8 and of the 8-bit code pages that test machines write. */
async function isText(open: () => Promise<Readable>): Promise<boolean> {
  let bytes = 0
  let start = ''
  for await (const chunk of bytesOf(await open())) {
    if (chunk.some((byte) => (byte < 0x20 && ![0x09, 0x0a, 0x0c, 0x0d].includes(byte)) || byte === 0x7f)) return false
    if (start.length < 512) start += Buffer.from(chunk).toString('latin1', 0, 512)
    bytes += chunk.length
  }
  // Markup is text as well, but nothing we accept begins like that, and a browser might run it.
  return bytes > 0 && !/^(\xef\xbb\xbf)?\s*<[!?a-z]/i.test(start)
}

async function* bytesOf(content: Readable): AsyncGenerator<Uint8Array> {
  for await (const chunk of content) {
    if (!(chunk instanceof Uint8Array)) throw new TypeError('a file is read as bytes')
    yield chunk
  }
}
