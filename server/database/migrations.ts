import { sql as firstTables } from './migrations/20261201090000-first-tables.ts'

/** Every migration, in the order of its name. One that has run is never edited. */
export const migrations: readonly { name: string; sql: string }[] = [{ name: '20261201090000-first-tables', sql: firstTables }]
