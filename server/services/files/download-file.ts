import type { Readable } from 'node:stream'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { loadOne } from '../../models/load.ts'
import { withFileStore } from './with-file-store.ts'

/** A file's content: as it came, or for a picture its copy for display. */
export async function downloadFile(fileId: string, as: 'original' | 'display', caller: Caller): Promise<{ name: string; mediaType: string; content: Readable }> {
  const { name, mediaType, storeKey, displayKey, removedAt } = await loadOne(File, 'File', fileId, caller)
  if (removedAt) throw new Problem('not-found', 'there is no such file')
  if (as === 'original') return { name, mediaType, content: await withFileStore(() => outside().files.open(storeKey)) }
  if (!displayKey) throw new Problem('not-acceptable', 'only pictures have a copy for display', { as: 'this file is no picture' })
  const shown = mediaType === 'image/png' ? { mediaType, name } : { mediaType: 'image/jpeg', name: name.replace(/\.\w+$/, '.jpg') }
  return { ...shown, content: await withFileStore(() => outside().files.open(displayKey)) }
}
