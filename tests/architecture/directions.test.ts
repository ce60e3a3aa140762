import { expect, it } from 'vitest'
import { files, imports, inside, testFiles } from './sources.ts'

const foundations = ['units', 'statistics', 'method', 'api', 'access', 'routing', 'planning', 'orders', 'travellers', 'reports', 'tools']
const subjects = [...new Set(files.flatMap((file) => /^shared\/([^/]+)\//.exec(file)?.[1] ?? []))].filter((name) => !foundations.includes(name)).map((name) => `shared/${name}`)

/** Who may import whom. A folder may always import itself; the longest matching name decides. */
const allowed: Record<string, string[]> = {
  'shared/units': [],
  'shared/statistics': ['shared/units'],
  'shared/method': ['shared/units', 'shared/statistics'],
  ...Object.fromEntries(subjects.map((name) => [name, ['shared/units', 'shared/statistics', 'shared/method']])),
  'shared/tools': ['shared/units', 'shared/statistics', 'shared/method', ...subjects],
  'shared/methods': ['shared/method', ...subjects],
  'shared/evaluate': ['shared/units', 'shared/statistics', 'shared/method', 'shared/methods', 'shared/tools'],
  'shared/routing': [],
  'shared/planning': [],
  'shared/api': ['shared/units', 'shared/method', 'shared/methods'],
  'shared/access': ['shared/api'],
  'shared/reports': ['shared/api', 'shared/units', 'shared/method'],
  'shared/travellers': ['shared/api', 'shared/method'],
  'shared/orders': ['shared/api', 'shared/units', 'shared/method', 'shared/methods'],
  'shared': ['shared'],
  'server/integrations': ['shared'],
  'server/database/seeds': ['shared', 'server'],
  'server/database': ['shared'],
  'server/models': ['shared', 'server/database'],
  'server/services': ['shared', 'server/models', 'server/database', 'server/integrations', 'server/caller'],
  'server/http': ['shared', 'server/services', 'server/models', 'server/database', 'server/integrations', 'server/caller'],
  'server/routes': ['shared', 'server/http', 'server/services', 'server/caller'],
  'server': ['shared', 'server'],
  'worker': ['shared', 'server/services', 'server/models', 'server/integrations', 'server/database'],
  'src/lib': ['shared'],
  'src/api': ['shared', 'src/lib'],
  'src/components/ui': ['shared', 'src/lib'],
  'src/components/shell': ['shared', 'src/lib', 'src/components/ui'],
  'src/methods': ['shared', 'src/lib', 'src/components/ui'],
  'src/components': ['shared', 'src/lib', 'src/api', 'src/components/ui', 'src/methods'],
  'src/pages': ['shared', 'src/lib', 'src/api', 'src/components', 'src/methods'],
  'src': ['shared', 'src'],
  'fakes': [],
}
const outside: Record<string, RegExp> = { shared: /^(zod|decimal\.js|@casl\/ability)(\/|$)/, src: /^(?!node:|express|sequelize|bullmq|ioredis|pg$)/ }

it('imports only in the allowed directions', () => {
  const broken = files.flatMap((file) => imports.get(file)!.filter((to) => !mayImport(file, to)).map((to) => `${file} -> ${to}`))
  expect(broken).toEqual([])
})

it('has no import cycles, not even of types', () => expect(cycles()).toEqual([]))

it('keeps pages apart: one page never imports another area of pages', () => {
  const area = (file: string) => /^src\/pages\/([^/]+)\//.exec(file)?.[1]
  expect(files.flatMap((file) => imports.get(file)!.filter((to) => area(file) && area(to) && area(file) !== area(to)).map((to) => `${file} -> ${to}`))).toEqual([])
})

it('imports nothing from the tests', () => {
  const exempt = (file: string) => inside(file, 'server/database/seeds')
  expect(files.filter((file) => !exempt(file) && imports.get(file)!.some((to) => inside(to, 'tests')))).toEqual([])
})

it('fetches nowhere but in the one place that calls the server', async () => {
  const { textOf } = await import('./sources.ts')
  expect(files.filter((file) => file.startsWith('src/') && !file.startsWith('src/lib/') && /\bfetch\(/.test(textOf(file)))).toEqual([])
})

it('has tests that import what they name', () => expect(testFiles.length).toBeGreaterThan(20))

function mayImport(from: string, to: string): boolean {
  if (to.startsWith('pkg:')) {
    const rule = outside[from.split('/')[0]!]
    return !rule || rule.test(to.slice(4))
  }
  if (from.startsWith('server/bin/')) return inside(to, 'server') || inside(to, 'shared')
  const layer = Object.keys(allowed).filter((name) => inside(from, name)).sort((a, b) => b.length - a.length)[0]
  return layer !== undefined && (inside(to, layer) || allowed[layer]!.some((name) => inside(to, name)) || /\.(css|svg)$/.test(to))
}

function cycles(): string[] {
  const found: string[] = []
  const done = new Set<string>()
  const path: string[] = []
  const visit = (file: string) => {
    if (path.includes(file)) { found.push([...path.slice(path.indexOf(file)), file].join(' -> ')); return }
    if (done.has(file)) return
    path.push(file)
    for (const to of imports.get(file) ?? []) if (imports.has(to)) visit(to)
    path.pop()
    done.add(file)
  }
  for (const file of files) visit(file)
  return found
}
