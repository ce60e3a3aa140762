// npm run build: bundles of the server's programs and of the browser's part, all below .build.
import fs from 'node:fs'
import path from 'node:path'
import zlib from 'node:zlib'
import { explain } from './launcher/failure.mjs'
import { buildFolder, inProject, project } from './launcher/data/project.mjs'
import { markBuilt, markUnbuilt, sourcesHash } from './launcher/sources-hash.mjs'

/** Where each bundle goes (below .build) and the file it starts from. */
const programs = {
  'api/index': 'server/index.ts',
  'worker/index': 'worker/index.ts',
  'fakes/stripe': 'fakes/stripe/serve.ts',
  'fakes/mail': 'fakes/mail/serve.ts',
  'bin/migrate': 'server/bin/migrate.ts',
  'bin/seed': 'server/bin/seed.ts',
}

/** Commands of the server that a version may be without. */
const commands = {
  'bin/evaluate': 'server/bin/evaluate.ts',
  'bin/plan': 'server/bin/plan.ts',
  'bin/ledger-verify': 'server/bin/ledger-verify.ts',
}

async function bundlePrograms() {
  const esbuild = await import('esbuild')
  const present = Object.entries(commands).filter(([, file]) => fs.existsSync(inProject(file)))
  await esbuild.build({
    absWorkingDir: project,
    entryPoints: { ...programs, ...Object.fromEntries(present) },
    outdir: buildFolder,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    logLevel: 'warning',
  })
}

async function bundleClient() {
  const vite = await import('vite')
  await vite.build({ root: project, configFile: inProject('vite.config.ts'), logLevel: 'warn' })
}

/** Every text file of the browser's part also pressed with Brotli at its best, once, so that no request has to. */
function pressClient() {
  const folder = path.join(buildFolder, 'client')
  for (const name of fs.readdirSync(folder, { recursive: true })) {
    const file = path.join(folder, name)
    if (!/\.(js|css|html|svg)$/.test(name) || fs.statSync(file).size < 1024) continue
    const text = fs.readFileSync(file)
    fs.writeFileSync(`${file}.br`, zlib.brotliCompressSync(text, { params: { [zlib.constants.BROTLI_PARAM_SIZE_HINT]: text.length } }))
  }
}

try {
  process.env.NODE_ENV = 'production'
  const hash = sourcesHash() // of before the build: a change made during it is built again next time
  markUnbuilt()
  await bundlePrograms()
  await bundleClient()
  pressClient()
  markBuilt(hash)
} catch (error) {
  console.error(error.errors ? error.message : explain(error)) // esbuild's list of errors says it all
  process.exitCode = 1
}
