import type { TestRun } from '../../../shared/api/test-runs.ts'
import { inputOf } from '../../../shared/method/entries.ts'
import type { Picture } from '../../../shared/method/picture.ts'
import { methodOf } from '../../../shared/methods.ts'
import { RunPicture } from '../ui/pictures/run-picture.tsx'

/** The pictures that the method draws of a run; nothing where it draws none. */
export function RunPictures({ run }: { run: TestRun }) {
  const pictures = picturesOf(run)
  if (pictures.length === 0) return null
  return <div className="mb-6.5 grid gap-6">{pictures.map((picture) => <RunPicture key={picture.title} picture={picture} height={300} />)}</div>
}

/** Readings that make no result make no picture either; the rules above say what is wrong with them. */
function picturesOf(run: TestRun): Picture[] {
  const method = methodOf(run.methodId)
  if (!method?.pictures) return []
  try {
    return method.pictures(inputOf(run.parameters, run.readings.filter(({ struck }) => !struck), method.isSet))
  } catch {
    return []
  }
}
