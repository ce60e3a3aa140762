import { Problem } from '../../../shared/problems.ts'

/** Refused for coming too often; says after how many whole seconds another try can work. */
export class TooMany extends Problem {
  readonly seconds: number

  constructor(milliseconds: number) {
    const seconds = Math.max(1, Math.ceil(milliseconds / 1000))
    super('too-many', `too many tries; try again in ${seconds < 120 ? `${seconds} ${seconds === 1 ? 'second' : 'seconds'}` : `${Math.ceil(seconds / 60)} minutes`}`)
    this.seconds = seconds
  }
}
