import { dirname, basename } from 'node:path'
import { expect, it } from 'vitest'
import { files, testFiles, textOf } from './sources.ts'

const isTable = (file: string) => /\/(tables|migrations|records)\//.test(file)
const all = [...files, ...testFiles]

it('has no file above 300 lines', () => expect(all.filter((file) => !isTable(file) && textOf(file).split('\n').length > 301)).toEqual([]))

it('has at most 15 files in a folder', () => {
  const counts = new Map<string, number>()
  for (const file of files) if (!isTable(file)) counts.set(dirname(file), (counts.get(dirname(file)) ?? 0) + 1)
  expect([...counts].filter(([, count]) => count > 15)).toEqual([])
})

it('names files in kebab-case', () => expect(all.filter((file) => !/^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z]+)+$/.test(basename(file)) && !isTable(file))).toEqual([]))

it('has no generic files', () => {
  expect(all.filter((file) => /^(utils?|helpers?|misc|common|types|constants)$/.test(basename(file).split('.')[0]!))).toEqual([])
})

it('has index files only where a process starts', () => {
  expect(files.filter((file) => /\/index\.[a-z]+$/.test(file) && file !== 'server/index.ts' && file !== 'worker/index.ts')).toEqual([])
})

it('suppresses no rule without a reason on the same line, and never uses any', () => {
  const marks = all.filter((file) => !file.startsWith('tests/architecture/')).flatMap((file) => textOf(file).split('\n').flatMap((line, at) => {
    const suppressed = /eslint-disable|@ts-expect-error/.exec(line)
    const code = line.replace(/\/\*.*?\*\/|\/\/.*|^\s*\*.*|'[^']*'/g, '')
    const bare = /@ts-ignore|@ts-nocheck/.test(line) || /: any\b|\bas any\b|<any\b/.test(code) || (suppressed !== null && !/-- \S|: \S/.test(line))
    return bare ? [`${file}:${at + 1}`] : []
  }))
  expect(marks).toEqual([])
})

it('keeps method names inside shared, the list of views and the seeds excepted', () => {
  const ids = files.filter((file) => file.startsWith('shared/')).flatMap((file) => [...textOf(file).matchAll(/defineMethod\(\{\s*id: '([^']+)'/g)].map((match) => match[1]!))
  expect(ids.length).toBeGreaterThanOrEqual(3)
  // words that a password must not consist of are no names of methods
  const exempt = (file: string) => file.startsWith('shared/') || file.startsWith('server/database/seeds/') || file === 'src/methods/views.ts' || file.endsWith('/check-password.ts')
  expect(files.filter((file) => !exempt(file) && ids.some((id) => textOf(file).includes(`'${id}'`)))).toEqual([])
})

it('keeps role names inside shared, the rules of the database and the seeds excepted', () => {
  const exempt = (file: string) => file.startsWith('shared/') || /^server\/(bin|database\/(seeds|migrations))\//.test(file)
  expect(files.filter((file) => !exempt(file) && /['"](client|technician|manager)['"]/.test(textOf(file)))).toEqual([])
})

it('says every refusal by a code of the one table', () => {
  expect(files.filter((file) => file.startsWith('server/services/') && /\bres\.status\(|statusCode/.test(textOf(file)))).toEqual([])
})
