import fs from 'node:fs'
import path from 'node:path'
import { dataFolder, inProject, project } from '../data/project.mjs'
import { run } from '../processes/run.mjs'

/**
 * Counts what vitest's JSON report says. A file that could not be loaded has no tests to fail and counts as one failure, and so
 * does a run that ended badly although no test failed (an unhandled error, no test files at all, no report).
 */
export function count(report, status) {
  const files = report?.testResults ?? []
  const tests = files.flatMap((file) => file.assertionResults)
  const passed = tests.filter((test) => test.status === 'passed').length
  const failedTests = tests.filter((test) => test.status === 'failed').length
  const brokenFiles = files.filter((file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed')).length
  const left = tests.length - passed - failedTests
  let failed = failedTests + brokenFiles
  let fault
  if (files.length === 0) fault = 'There are no test files, or they could not be read.'
  else if (passed + failed === 0) fault = 'No test ran.'
  else if (status !== 0 && failed === 0) fault = `No test failed, and yet vitest ended with ${status}.`
  if (fault) failed += 1
  return { passed, failed, left, fault }
}

/** One project of vite.config.ts. Vitest's own output is shown; the count comes from its report file. */
export const vitestCheck = (name, title) => ({
  title,
  async perform(env) {
    const report = path.join(dataFolder, `report-${name}-${process.pid}.json`)
    const args = [inProject('node_modules/vitest/vitest.mjs'), 'run', '--project', name, '--reporter', 'default', '--reporter', 'json', `--outputFile.json=${report}`]
    try {
      const { status } = await run(process.execPath, args, { cwd: project, env, show: true, mayFail: true })
      return count(fs.existsSync(report) ? JSON.parse(fs.readFileSync(report, 'utf8')) : null, status)
    } finally {
      fs.rmSync(report, { force: true })
    }
  },
})
