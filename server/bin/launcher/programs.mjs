import { fakeEnvironment, environmentOf } from './environment.mjs'
import { freshLog } from './data/logs.mjs'
import { launchNode } from './processes/node-child.mjs'
import { inProject } from './data/project.mjs'
import { run } from './processes/run.mjs'
import { supervise } from './processes/supervise.mjs'

const health = (port) => `http://127.0.0.1:${port}/healthz`
const built = (file) => ['--enable-source-maps', file]
const fromSource = (file) => ['--import', 'tsx', file]

/** The long-running programs: source, bundle, environment, and where they say that they are well. `watched`: reloaded by `npm run dev`. */
const programs = {
  stripe: { title: 'Payment stand-in', source: 'fakes/stripe/serve.ts', bundle: '.build/fakes/stripe.js', env: (own) => fakeEnvironment('stripe', own), health: (own) => health(own.ports.stripe) },
  mail: { title: 'Mail stand-in', source: 'fakes/mail/serve.ts', bundle: '.build/fakes/mail.js', env: (own) => fakeEnvironment('mail', own), health: (own) => health(own.ports.mail) },
  api: { title: 'API', source: 'server/index.ts', bundle: '.build/api/index.js', env: (own) => environmentOf('api', own), health: (own) => health(own.ports.api), watched: true },
  worker: { title: 'Worker', source: 'worker/index.ts', bundle: '.build/worker/index.js', env: (own) => environmentOf('worker', own), health: () => undefined, watched: true },
}

export const programNames = [...Object.keys(programs), 'vite']
export const titleOf = (name) => programs[name].title

/** Keeps one of them running; `ready` when it answers. */
export function keepProgram(name, own) {
  const program = programs[name]
  const hint = own.dev ? program.source : program.bundle
  const args = own.dev ? [...(program.watched ? ['--watch', '--watch-preserve-output'] : []), ...fromSource(program.source)] : built(program.bundle)
  const log = freshLog(name)
  return supervise({
    name,
    title: program.title,
    hint,
    launch: (onSpawn) => launchNode({ title: program.title, args, env: program.env(own), log, health: program.health(own), onSpawn }),
  })
}

/** Vite's own server, for `npm run dev`. */
export function keepVite(own) {
  const port = own.ports.web
  const script = 'node_modules/vite/bin/vite.js'
  const log = freshLog('vite')
  return supervise({
    name: 'vite',
    title: 'Vite',
    hint: script,
    launch: (onSpawn) => launchNode({
      title: 'Vite',
      args: [script, '--host', 'localhost', '--port', String(port), '--strictPort', '--clearScreen', 'false'],
      env: { ...environmentOf('vite', own), NODE_ENV: 'development', API_PORT: String(own.ports.api) },
      log,
      health: `http://localhost:${port}/`,
      onSpawn,
    }),
  })
}

/** Runs migrate or seed to its end; returns what it wrote. */
export async function runOnce(name, own) {
  const args = own.dev ? fromSource(`server/bin/${name}.ts`) : built(`.build/bin/${name}.js`)
  const { stdout } = await run(process.execPath, args, { cwd: inProject(), env: environmentOf(name, own), log: freshLog(name) })
  return stdout
}
