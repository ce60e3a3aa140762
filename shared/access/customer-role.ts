import type { Role } from '../api/words.ts'

/** Who acts for a customer: orders, answers questions, receives reports. */
export const customerRole: Role = 'client'
