import connectPgSimple from 'connect-pg-simple'
import session, { type SessionData } from 'express-session'
import pg from 'pg'
import { log } from '../log.ts'
import { absoluteMs, idleMs } from './session-times.ts'

const PgStore = connectPgSimple(session)

/** The idle time is written anew at most this often: a page of ten requests costs one write. */
const touchEveryMs = 60_000
const touchesRemembered = 10_000

/**
 * Sessions in PostgreSQL. The cookie itself names no end; the row ends when nobody used it for the idle time, or at the
 * absolute end, whichever is first. A touch is an update, so one that comes late never brings an ended session back.
 */
export class SessionStore extends PgStore {
  readonly #pool: pg.Pool
  readonly #touched = new Map<string, number>()

  constructor(databaseUrl: string) {
    const pool = new pg.Pool({ connectionString: databaseUrl, max: 6, application_name: 'crosshead-sessions', connectionTimeoutMillis: 10_000, statement_timeout: 10_000 })
    pool.on('error', (error) => log.warn({ error: error.message }, 'a session connection was lost'))
    super({ pool, tableName: 'sessions', errorLog: (message: unknown, error: unknown) => log.error({ error }, String(message)) })
    this.#pool = pool
  }

  override set(sid: string, data: SessionData, callback?: (error?: unknown) => void): void {
    super.set(sid, ending(data), callback)
  }

  override touch(sid: string, data: SessionData, callback?: () => void): void {
    const now = Date.now()
    if (now - (this.#touched.get(sid) ?? 0) < touchEveryMs) return callback?.()
    if (this.#touched.size >= touchesRemembered) this.#touched.clear()
    this.#touched.set(sid, now)
    super.touch(sid, ending(data), callback)
  }

  async end(): Promise<void> {
    this.close()
    await this.#pool.end()
  }
}

function ending(data: SessionData): SessionData {
  const now = Date.now()
  const expires = new Date(Math.min(now + idleMs(data.sharedScreen), (data.startedAt ?? now) + absoluteMs))
  return { ...data, cookie: { ...data.cookie, originalMaxAge: null, expires } }
}
