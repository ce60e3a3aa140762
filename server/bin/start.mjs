// npm start and npm run dev: brings up everything, says where it is, and takes it down again on Ctrl-C.
import { isEmbedded, missingVariable, given, valueOf } from './launcher/environment.mjs'
import { explain, Failure } from './launcher/failure.mjs'
import { interruption, listenForInterruption, untilInterrupted } from './launcher/processes/interruption.mjs'
import { boundLogs, freshLog } from './launcher/data/logs.mjs'
import { checkNodeVersion } from './launcher/node-version.mjs'
import { ensurePackages } from './launcher/packages.mjs'
import { choosePorts } from './launcher/processes/ports.mjs'
import { keepProgram, keepVite, programNames, runOnce, titleOf } from './launcher/programs.mjs'
import { inProject } from './launcher/data/project.mjs'
import { readAccounts, welcome } from './launcher/welcome.mjs'
import { announce, releaseLock, takeLock } from './launcher/data/run-lock.mjs'
import { run } from './launcher/processes/run.mjs'
import { say, step } from './launcher/say.mjs'
import { embeddedFolders, embedPostgres, embedRedis, endEmbedded } from './launcher/services/embedded.mjs'
import { ensurePrograms } from './launcher/services/system-programs.mjs'
import { isBuilt } from './launcher/sources-hash.mjs'
import { endNoted } from './launcher/processes/supervise.mjs'

const LOG_CHECK_MS = 60_000
const dev = process.argv.includes('--dev')

/** What runs, in the order it was started; stopped in reverse. */
const kept = []
const keep = (service) => {
  kept.push(service)
  return service
}

async function prepare() {
  const needed = [isEmbedded('postgres') && 'postgresql', isEmbedded('redis') && 'redis-server'].filter(Boolean)
  if (needed.length > 0) await step('Database and queue programs', () => ensurePrograms(needed))
  await step('Packages of the lock file', ensurePackages)
  await endNoted(programNames) // after a kill -9 of an earlier launcher
  if (needed.length === 0) return null
  const folders = embeddedFolders()
  if (folders.note) say(`Note: ${folders.note}`)
  await endEmbedded(folders)
  return folders
}

function portsWanted() {
  return [
    { name: 'api', preferred: 4300, asked: dev ? undefined : given('PORT') },
    dev && { name: 'web', preferred: 4301, asked: given('PORT') },
    isEmbedded('mail') && { name: 'mail', preferred: 4302 },
    isEmbedded('mail') && { name: 'smtp', preferred: 4303 },
    isEmbedded('stripe') && { name: 'stripe', preferred: 4304 },
    isEmbedded('postgres') && { name: 'postgres', preferred: 4305 },
    isEmbedded('redis') && { name: 'redis', preferred: 4306 },
  ].filter(Boolean)
}

async function startServers(folders, own) {
  if (isEmbedded('postgres')) {
    await step('PostgreSQL', async () => {
      own.postgres = await embedPostgres(folders, own.ports.postgres, keep)
      return `${own.postgres.isNew ? 'new cluster, ' : ''}port ${own.ports.postgres}`
    })
  }
  if (isEmbedded('redis')) {
    await step('Redis', async () => {
      own.redis = await embedRedis(folders, own.ports.redis, keep)
      return `port ${own.ports.redis}`
    })
  }
}

async function build() {
  if (isBuilt()) return 'unchanged'
  await run(process.execPath, [inProject('server/bin/build.mjs')], { cwd: inProject(), log: freshLog('build') })
  return 'built'
}

async function fillDatabase(own) {
  await step('Database tables', async () => {
    await runOnce('migrate', own)
    return 'up to date'
  })
  if (!['1', 'true'].includes(valueOf('CROSSHEAD_DEMO', own))) return []
  let accounts = []
  await step('Demonstration company', async () => {
    accounts = readAccounts(await runOnce('seed', own))
    return 'there'
  })
  return accounts
}

async function startPrograms(own) {
  const names = [isEmbedded('stripe') && 'stripe', isEmbedded('mail') && 'mail', 'api', 'worker'].filter(Boolean)
  await step(names.map(titleOf).join(', '), async () => {
    const services = names.map((name) => keep(keepProgram(name, own)))
    if (dev) services.push(keep(keepVite(own)))
    await Promise.all(services.map(({ ready }) => ready))
    return 'running'
  })
}

async function start() {
  const missing = missingVariable()
  if (missing) throw new Failure(missing)
  const folders = await prepare()
  const ports = await choosePorts(portsWanted())
  const own = { dev, ports, postgres: null, redis: null, stripe: isEmbedded('stripe'), mail: isEmbedded('mail') }
  await startServers(folders, own)
  if (!dev) await step('Build', build)
  const accounts = await fillDatabase(own)
  await startPrograms(own)
  announce(valueOf('BASE_URL', own))
  say(welcome({ address: valueOf('BASE_URL', own), mailPage: valueOf('MAIL_PAGE_URL', own), accounts }))
}

async function stopAll() {
  for (const service of kept.toReversed()) await service.stop()
}

async function main() {
  checkNodeVersion()
  listenForInterruption()
  const other = takeLock()
  if (other) {
    say(other.address ? `Crosshead is running already: ${other.address} (process ${other.pid})` : `Crosshead is being started already, by process ${other.pid}.`)
    return 0
  }
  let status = 0
  try {
    await start()
    const timer = setInterval(() => boundLogs([...programNames, 'postgres', 'redis']), LOG_CHECK_MS)
    await untilInterrupted()
    clearInterval(timer)
  } catch (error) {
    status = interruption.aborted ? 130 : 1
    if (!interruption.aborted) say(`\n${explain(error)}`)
  }
  if (kept.length > 0) await step('\nStopping', () => stopAll().then(() => 'stopped'))
  releaseLock()
  return status
}

try {
  process.exitCode = await main()
} catch (error) {
  say(explain(error))
  process.exitCode = 1
}
