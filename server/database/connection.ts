import pg from 'pg'
import { Sequelize } from 'sequelize'

// BIGINT columns here (ledger numbers, sizes) stay far below 2^53, so they may be plain numbers.
pg.types.setTypeParser(pg.types.builtins.INT8, Number)

const url = process.env.DATABASE_URL
if (!url) throw new Error('DATABASE_URL is missing: where is PostgreSQL?')

/** The one connection pool of this process, as the application's user: it owns no table and cannot alter what is append-only. */
export const database = new Sequelize(url, {
  dialect: 'postgres',
  logging: false,
  pool: { max: 12, min: 0, acquire: 15_000, idle: 10_000 },
  dialectOptions: { application_name: 'crosshead', statement_timeout: 20_000, idle_in_transaction_session_timeout: 20_000 },
})
