/** Every way a request can be refused, with its HTTP status. The only such table. */
export const problems = {
  'not-signed-in': 401,
  'wrong-sign-in': 401,
  'not-allowed': 403,
  'not-found': 404,
  'already-changed': 409,
  'not-now': 409,
  'too-large': 413,
  'not-acceptable': 422,
  'too-many': 429,
  'unexpected': 500,
  'unavailable': 503,
} as const

export type ProblemCode = keyof typeof problems

/** A refusal: its code for programs, its message for people, and what is wrong with which field. */
export class Problem extends Error {
  readonly code: ProblemCode
  readonly fields: Record<string, string>
  constructor(code: ProblemCode, detail: string, fields: Record<string, string> = {}) {
    super(detail)
    this.name = 'Problem'
    this.code = code
    this.fields = fields
  }
}
