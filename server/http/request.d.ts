import type { Caller } from '../caller.ts'

declare global {
  namespace Express {
    interface Request {
      caller: Caller | null
      requestId: string
    }
    /** What a session says of the signed-in person; the rest is read afresh. */
    interface User {
      id: string
      /** Of the person at sign-in; a session of another epoch is over. */
      epoch: number
    }
  }
}
declare module 'express-session' {
  interface SessionData {
    startedAt: number
    epoch: number
    sharedScreen: boolean
  }
}
