import { createHash } from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { buildFolder, inProject, project } from './data/project.mjs'

const sources = ['src', 'server', 'worker', 'shared', 'fakes', 'index.html', 'package-lock.json', 'tsconfig.json', 'vite.config.ts', 'tailwind.config.ts']

const stamp = path.join(buildFolder, 'sources')

function filesIn(entry) {
  if (!fs.existsSync(entry)) return []
  if (!fs.statSync(entry).isDirectory()) return [entry]
  return fs.readdirSync(entry).sort().flatMap((name) => filesIn(path.join(entry, name)))
}

/** One hash over name and content of everything a build reads. */
export function sourcesHash() {
  const hash = createHash('sha256').update(process.versions.node)
  for (const file of sources.flatMap((name) => filesIn(inProject(name)))) {
    hash.update(`\0${path.relative(project, file)}\0`).update(fs.readFileSync(file))
  }
  return hash.digest('hex')
}

export const isBuilt = () => fs.existsSync(stamp) && fs.readFileSync(stamp, 'utf8') === sourcesHash()

/** Before a build: what is there no longer counts. */
export const markUnbuilt = () => fs.rmSync(stamp, { force: true })

export const markBuilt = (hash) => fs.writeFileSync(stamp, hash)
