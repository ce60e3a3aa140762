import { project } from '../data/project.mjs'
import { run } from '../processes/run.mjs'

/** A check that is one command: it counts as one, passed when the command succeeds. */
export const commandCheck = (title, args) => ({
  title,
  async perform(env) {
    const { status } = await run(process.execPath, args, { cwd: project, env, show: true, mayFail: true })
    return status === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1, fault: `${title} failed (${status}).` }
  },
})
