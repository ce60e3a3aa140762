import { benchEndpoints } from './api/benches.ts'
import { changeEndpoints } from './api/changes.ts'
import type { Endpoint } from './api/endpoint.ts'
import { evaluationEndpoints } from './api/evaluations.ts'
import { fileEndpoints } from './api/files.ts'
import { jobEndpoints } from './api/jobs.ts'
import { peopleEndpoints } from './api/people.ts'
import { reportEndpoints } from './api/reports.ts'
import { sampleEndpoints } from './api/samples.ts'
import { sessionEndpoints } from './api/sessions.ts'
import { testRunEndpoints } from './api/test-runs.ts'

/** Every operation of the product. `tests/api/every-endpoint.test.ts` walks this list. */
export const endpoints: readonly Endpoint[] = [
  ...sessionEndpoints, ...peopleEndpoints, ...evaluationEndpoints, ...jobEndpoints, ...sampleEndpoints, ...benchEndpoints,
  ...testRunEndpoints, ...reportEndpoints, ...fileEndpoints, ...changeEndpoints,
]
