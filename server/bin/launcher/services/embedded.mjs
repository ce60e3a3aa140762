import { randomUUID } from 'node:crypto'
import path from 'node:path'
import { freshLog } from '../data/logs.mjs'
import { dataFolder } from '../data/project.mjs'
import { recall, remember } from '../data/remembered.mjs'
import { secret } from '../data/secrets.mjs'
import { supervise } from '../processes/supervise.mjs'
import { makeCluster } from './make-cluster.mjs'
import { endPostgresIn, hasCluster, programsFor, startPostgres } from './postgres.mjs'
import { endRedisIn, redisUrl, startRedis } from './redis.mjs'
import { APP, databaseUrl, ensureRoles, OWNER, SUPERUSER } from './roles.mjs'
import { serverFolders } from './server-folders.mjs'

/**
 * The folders of the servers of this checkout. A fallback outside of it carries a random name that is kept in .data, so that a new checkout
 * in an old place never meets the data of the old one.
 */
export function embeddedFolders() {
  const id = recall('id') ?? randomUUID()
  remember('id', id)
  return serverFolders(dataFolder, path.join('/var/lib', `crosshead-${id}`))
}

/** Ends servers that outlived a killed launcher, so that their ports are free again. */
export async function endEmbedded(folders) {
  await endPostgresIn(folders.postgres)
  await endRedisIn(folders.redis)
}

/** The private PostgreSQL: made when it is not there, kept running, with its roles and its database. */
export async function embedPostgres(folders, port, keep) {
  const passwords = { superuser: secret('postgres-superuser'), owner: secret('postgres-owner'), app: secret('postgres-app') }
  const bin = programsFor(folders.postgres)
  const isNew = !hasCluster(folders.postgres)
  const log = freshLog('postgres')
  if (isNew) await makeCluster(bin, folders, { superuser: SUPERUSER, password: passwords.superuser })
  const server = keep(supervise({
    name: 'postgres',
    title: 'PostgreSQL',
    launch: (onSpawn) => startPostgres(bin, folders, { port, log, onSpawn }),
    stopSignal: 'SIGINT',
    patienceMs: 60_000,
  }))
  await server.ready
  await ensureRoles(bin, { port, passwords })
  return { isNew, appUrl: databaseUrl(APP, passwords.app, port), ownerUrl: databaseUrl(OWNER, passwords.owner, port) }
}

/** The private Redis, kept running. */
export async function embedRedis(folders, port, keep) {
  const password = secret('redis')
  const log = freshLog('redis')
  const server = keep(supervise({
    name: 'redis',
    title: 'Redis',
    launch: (onSpawn) => startRedis(folders, { port, password, log, onSpawn }),
  }))
  await server.ready
  return { url: redisUrl(password, port) }
}
