import pg from 'pg'
import { Umzug } from 'umzug'
import { migrations } from './migrations.ts'

/**
 * Brings the database at `ownerUrl` to the newest tables, each migration in a transaction of its own, and gives the
 * application's user of `appUrl` its rights: everything on ordinary tables, only reading and adding on append-only ones.
 * Two at once wait for each other.
 */
export async function migrate(ownerUrl: string, appUrl: string): Promise<string[]> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  try {
    await client.query('select pg_advisory_lock(7241)')
    await client.query('create table if not exists migrations (name text primary key, ran_at timestamptz not null default now())')
    const umzug = new Umzug({
      logger: undefined,
      migrations: migrations.map(({ name, sql }) => ({ name, up: () => inOneTransaction(client, name, sql) })),
      storage: {
        executed: async () => (await client.query<{ name: string }>('select name from migrations order by name')).rows.map((row) => row.name),
        logMigration: () => Promise.resolve(),
        unlogMigration: () => Promise.resolve(),
      },
    })
    const fresh = await umzug.up()
    await grantRights(client, decodeURIComponent(new URL(appUrl).username), decodeURIComponent(new URL(ownerUrl).username))
    return fresh.map(({ name }) => name)
  } finally {
    await client.end()
  }
}

/** The note that it ran is part of the migration's own transaction, so that neither is there without the other. */
async function inOneTransaction(client: pg.Client, name: string, sql: string): Promise<void> {
  await client.query('begin')
  try {
    await client.query(sql)
    await client.query('insert into migrations (name) values ($1)', [name])
    await client.query('commit')
  } catch (error) {
    await client.query('rollback')
    throw error
  }
}

async function grantRights(client: pg.Client, app: string, owner: string): Promise<void> {
  if (app === owner) return
  const user = client.escapeIdentifier(app)
  const tables = await client.query<{ name: string; fixed: boolean }>(`
    select c.relname as name, exists (select 1 from pg_trigger t where t.tgrelid = c.oid and t.tgname = 'append_only') as fixed
    from pg_class c where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' and c.relname <> 'migrations'`)
  await client.query(`grant usage on schema public to ${user}`)
  for (const { name, fixed } of tables.rows) {
    const tableName = client.escapeIdentifier(name)
    await client.query(`revoke all on ${tableName} from ${user}`)
    await client.query(`grant ${fixed ? 'select, insert' : 'select, insert, update, delete'} on ${tableName} to ${user}`)
  }
}
