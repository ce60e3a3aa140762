import type { ProblemCode } from '../../shared/problems.ts'

/** What the server refused, or that it could not be reached; `message` is for people, `fields` for the inputs. */
export class Refusal extends Error {
  readonly code: ProblemCode | 'unreachable'
  readonly fields: Record<string, string>
  readonly requestId: string | undefined
  constructor(code: ProblemCode | 'unreachable', message: string, fields: Record<string, string> = {}, requestId?: string) {
    super(message)
    this.name = 'Refusal'
    this.code = code
    this.fields = fields
    this.requestId = requestId
  }
}
