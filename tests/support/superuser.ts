import pg from 'pg'
import { inject } from 'vitest'

/** Does something to this test file's database that the application's user may not: as whoever holds the whole server might. */
export async function asSuperuser<T>(work: (client: pg.Client) => Promise<T>): Promise<T> {
  const url = new URL(inject('adminUrl'))
  url.pathname = new URL(process.env.DATABASE_URL ?? '').pathname
  const client = new pg.Client({ connectionString: url.href })
  await client.connect()
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}
