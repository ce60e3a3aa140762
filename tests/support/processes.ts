import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer, type AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Redis } from 'ioredis'
import { afterAll } from 'vitest'

export type Running = { pid: number; kill(): Promise<void>; stop(): Promise<void>; output(): string }

const running = new Set<ChildProcess>()
afterAll(() => { for (const child of running) child.kill('SIGKILL') })

/** A process of the product as it runs in production, with this test file's database and the given settings. */
export function startProcess(entry: 'server/index.ts' | 'worker/index.ts', settings: Record<string, string>): Running {
  return watch(spawn(process.execPath, ['--import', 'tsx', entry], { env: { ...process.env, LOG_LEVEL: 'warn', ...settings }, stdio: ['ignore', 'pipe', 'pipe'] }))
}

/** A program of the build, as `npm start` runs it, with nothing but the given settings. */
export function startBuilt(bundle: string, settings: Record<string, string>): Running {
  return watch(spawn(process.execPath, ['--enable-source-maps', join('.build', bundle)], { env: { PATH: process.env.PATH, LOG_LEVEL: 'warn', NODE_ENV: 'production', ...settings }, stdio: ['ignore', 'pipe', 'pipe'] }))
}

function watch(child: ChildProcess): Running {
  running.add(child)
  let said = ''
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (data: Buffer) => { said = (said + data.toString()).slice(-20_000) })
  const gone = once(child, 'exit').then(() => { running.delete(child) })
  const end = async (signal: NodeJS.Signals) => { child.kill(signal); await gone }
  return { pid: child.pid!, kill: () => end('SIGKILL'), stop: () => end('SIGTERM'), output: () => said }
}

/** A Redis of the test's own, which it may kill: nothing it held survives. */
export async function startRedis(port: number): Promise<Running> {
  const folder = mkdtempSync(join(tmpdir(), 'crosshead-redis-'))
  const server = watch(spawn('redis-server', ['--port', String(port), '--bind', '127.0.0.1', '--save', '', '--appendonly', 'no', '--dir', folder], { stdio: ['ignore', 'pipe', 'pipe'] }))
  const client = new Redis({ port, host: '127.0.0.1', retryStrategy: () => 50, maxRetriesPerRequest: null })
  client.on('error', () => undefined)
  await client.ping()
  client.disconnect()
  return { ...server, async kill() { await server.kill(); rmSync(folder, { recursive: true, force: true }) } }
}

export async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1')
  await once(server, 'listening')
  const { port } = server.address() as AddressInfo
  server.close()
  return port
}

/** Waits until something is so; says what it waited for when it does not come. */
export async function until<T>(what: string, check: () => T | false | null | undefined | Promise<T | false | null | undefined>, seconds = 60): Promise<T> {
  const end = Date.now() + seconds * 1000
  let last: unknown
  while (Date.now() < end) {
    try {
      const value = await check()
      if (value) return value
    } catch (error) {
      last = error
    }
    await new Promise((resolve) => { setTimeout(resolve, 150) })
  }
  throw new Error(`waited ${seconds} s in vain: ${what}`, { cause: last })
}
