import type { Role } from '../api/words.ts'

/** Who works at benches, and so whom the planner may give a step. */
export const benchRole: Role = 'technician'
