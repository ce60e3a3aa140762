// npm test: all checks on throwaway services. With --check: the same without the browser's.
import { commandCheck } from './launcher/checks/command-check.mjs'
import { vitestCheck } from './launcher/checks/vitest-check.mjs'
import { explain } from './launcher/failure.mjs'
import { checkNodeVersion } from './launcher/node-version.mjs'
import { ensurePackages } from './launcher/packages.mjs'
import { interruption, listenForInterruption } from './launcher/processes/interruption.mjs'
import { say, step } from './launcher/say.mjs'
import { ensurePrograms } from './launcher/services/system-programs.mjs'
import { startThrowawayServices } from './launcher/throwaway-services.mjs'

const withBrowser = !process.argv.includes('--check')

const checks = [
  commandCheck('Types', ['node_modules/typescript/bin/tsc', '--noEmit']),
  commandCheck('Lint', ['node_modules/eslint/bin/eslint.js', '--config', '.config/eslint.config.js', '--max-warnings', '0', '.']),
  vitestCheck('unit', 'Formulas, published values, architecture'),
  vitestCheck('server', 'API, services, worker, faults'),
  vitestCheck('src', 'Pages'),
  commandCheck('Build', ['server/bin/build.mjs']),
  ...(withBrowser ? [vitestCheck('browser', 'Browser')] : []), // drives what was built just before
]

async function perform(check, env, total) {
  say(`\n── ${check.title}`)
  const began = performance.now()
  const { passed, failed, left = 0, fault } = await check.perform(env)
  total.passed += passed
  total.failed += failed
  if (fault) say(fault)
  const seconds = ((performance.now() - began) / 1000).toFixed(1)
  say(`${check.title}: ${passed} passed, ${failed} failed${left > 0 ? `, ${left} left out` : ''}  ${seconds} s`)
}

async function main(total) {
  checkNodeVersion()
  listenForInterruption()
  const needed = ['postgresql', 'redis-server', 'poppler-utils', ...(withBrowser ? ['chromium'] : [])]
  await step('Programs', () => ensurePrograms(needed))
  await step('Packages of the lock file', ensurePackages)
  let services
  await step('Throwaway PostgreSQL and Redis', async () => {
    services = await startThrowawayServices()
    return 'running'
  })
  const plain = process.stdout.isTTY ? {} : { NO_COLOR: '1', FORCE_COLOR: undefined } // a log file is read as it is
  const env = { ...process.env, ...plain, NODE_ENV: 'test', TEST_DATABASE_URL: services.databaseUrl, TEST_REDIS_URL: services.redisUrl }
  try {
    for (const check of checks) await perform(check, env, total)
  } finally {
    await services.stop()
  }
}

const total = { passed: 0, failed: 0 }
try {
  await main(total)
} catch (error) {
  total.failed += 1
  say(interruption.aborted ? '\nStopped before the end.' : `\n${explain(error)}`)
}
say(`\n${total.passed} passed, ${total.failed} failed`)
process.exitCode = total.failed > 0 || total.passed === 0 ? 1 : 0
