import { readdirSync, readFileSync, statSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')

/** Every source file of the product, from the top of the repository. */
export const files = ['shared', 'server', 'worker', 'src', 'fakes'].flatMap(walk)
export const testFiles = walk('tests')
export const textOf = (file: string) => readFileSync(join(root, file), 'utf8')

/** What each file imports: paths from the top, or `pkg:` and a package's name. Imports of types count. */
export const imports = new Map([...files, ...testFiles].map((file) => [file, importsOf(file)]))

function walk(folder: string): string[] {
  return readdirSync(join(root, folder)).sort().flatMap((name) => {
    const path = join(folder, name)
    if (statSync(join(root, path)).isDirectory()) return walk(path)
    return /\.(tsx?|mjs)$/.test(name) ? [path] : []
  })
}

function importsOf(file: string): string[] {
  return [...textOf(file).matchAll(/(?:^|\n)\s*(?:import|export)\s[^'"]*?from\s+['"]([^'"]+)['"]|(?:^|\n)\s*import\s+['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]/g)]
    .map((match) => match[1] ?? match[2] ?? match[3]!)
    .map((to) => (to.startsWith('.') ? relative(root, resolve(root, dirname(file), to)) : `pkg:${to}`))
}

export const inside = (file: string, folder: string) => file.startsWith(`${folder}/`) || file.replace(/\.tsx?$/, '') === folder
