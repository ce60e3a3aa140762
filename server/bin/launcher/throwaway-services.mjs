import { randomUUID } from 'node:crypto'
import { once } from 'node:events'
import fs from 'node:fs'
import path from 'node:path'
import { identify, isSame, signal } from './processes/processes.mjs'
import { dataFolder, inData } from './data/project.mjs'
import { anyFreePort } from './processes/ports.mjs'
import { randomSecret } from './data/secrets.mjs'
import { makeCluster } from './services/make-cluster.mjs'
import { endPostgresIn, programsFor, startPostgres } from './services/postgres.mjs'
import { endRedisIn, redisUrl, startRedis } from './services/redis.mjs'
import { databaseUrl, ensureRoles, SUPERUSER } from './services/roles.mjs'
import { serverFolders } from './services/server-folders.mjs'

const PREFIX = 'test-'
const elsewhere = (name) => path.join('/var/lib', `crosshead-${name}`)

/** Tests need speed and no safety: nothing here outlives them. */
const hasty = ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off', 'autovacuum=off', 'wal_level=minimal', 'max_wal_senders=0', 'max_connections=200']

/** Removes what killed test runs left: their folders, and servers that still run there. */
async function sweep() {
  fs.mkdirSync(dataFolder, { recursive: true })
  for (const name of fs.readdirSync(dataFolder).filter((each) => each.startsWith(PREFIX))) {
    const note = inData(name, 'owner.json')
    if (fs.existsSync(note) && isSame(JSON.parse(fs.readFileSync(note, 'utf8')))) continue
    for (const home of [inData(name), elsewhere(name)]) {
      await endPostgresIn(path.join(home, 'postgres'))
      await endRedisIn(path.join(home, 'redis'))
      fs.rmSync(home, { recursive: true, force: true })
    }
  }
}

/** The folder appears together with the note whose it is, or another run's sweep would take it for abandoned. */
function claimFolder(name) {
  const draft = inData(`new-${name}`)
  fs.mkdirSync(draft, { recursive: true })
  fs.writeFileSync(path.join(draft, 'owner.json'), JSON.stringify(identify(process.pid, '')))
  fs.renameSync(draft, inData(name))
  return inData(name)
}

/**
 * A PostgreSQL and a Redis of their own on free ports of 127.0.0.1, in a folder that `stop` removes. `databaseUrl` is the superuser's; the roles
 * `crosshead_owner` and `crosshead_app` are there too, with the same password as the superuser.
 */
export async function startThrowawayServices() {
  await sweep()
  const name = `${PREFIX}${randomUUID().slice(0, 8)}`
  const folder = claimFolder(name)
  const folders = serverFolders(folder, elsewhere(name))
  const password = randomSecret()
  const children = []
  const onSpawn = (child) => children.push(child)

  async function stop() {
    for (const child of children.splice(0)) {
      if (!child.pid || child.exitCode !== null || child.signalCode !== null) continue
      const end = once(child, 'exit')
      signal(child.pid, 'SIGQUIT') // PostgreSQL: at once, without a checkpoint
      const timer = setTimeout(() => signal(child.pid, 'SIGKILL'), 10_000)
      await end
      clearTimeout(timer)
    }
    await endPostgresIn(folders.postgres)
    for (const home of new Set([folders.home, folder])) fs.rmSync(home, { recursive: true, force: true })
  }

  try {
    const bin = programsFor(folders.postgres)
    await makeCluster(bin, folders, { superuser: SUPERUSER, password, safe: false })
    const [port, redisPort] = [await anyFreePort(), await anyFreePort()]
    await Promise.all([
      startPostgres(bin, folders, { port, log: path.join(folder, 'postgres.log'), settings: hasty, onSpawn }),
      startRedis(folders, { port: redisPort, password, log: path.join(folder, 'redis.log'), keep: false, onSpawn }),
    ])
    await ensureRoles(bin, { port, passwords: { superuser: password, owner: password, app: password } })
    return { databaseUrl: databaseUrl(SUPERUSER, password, port), redisUrl: redisUrl(password, redisPort), stop }
  } catch (error) {
    await stop()
    throw error
  }
}
