import { pino } from 'pino'

/** The process's log: JSON lines with UTC times; nothing secret is ever passed to it. */
export const log = pino({ level: process.env.LOG_LEVEL ?? (process.env.NODE_ENV === 'test' ? 'silent' : 'info'), base: null, timestamp: pino.stdTimeFunctions.isoTime })
