import type { Reading, SaveReadings, TestRun } from '../../../shared/api/test-runs.ts'
import { Refusal } from '../refusal.ts'
import { clashing } from './clashing.ts'
import type { ReadingStore } from './reading-store.ts'
import { nameOf, type Unsent } from './unsent.ts'

export type QueueState = {
  /** What the server has. It changes together with `unsent`, or a reading would be in neither for a moment and its row look free. */
  kept: readonly Reading[]
  unsent: readonly Unsent[]
  /** `waiting`: the server cannot be reached and is tried again. `stopped`: it said no to all of it; `problem` says why. */
  going: 'idle' | 'sending' | 'waiting' | 'stopped'
  problem: string
  /** When the server last had everything, by the browser's clock. */
  keptAt: number | null
  /** Unsent readings whose place is taken by another. */
  clashes: ReadonlySet<string>
  /** What the server will not keep, by key, with its reason. */
  refused: Readonly<Record<string, string>>
  /** Whether the browser's store took everything, so that a reload loses nothing. */
  isStored: boolean
}

type Given = {
  store: ReadingStore
  run: TestRun
  send: (body: SaveReadings) => Promise<TestRun>
  refetch: () => Promise<TestRun>
  /** Hands on the run as the server last gave it. */
  onRun: (run: TestRun) => void
  now?: () => number
  /** Pauses in ms before each further attempt; the last one repeats. */
  pauses?: readonly number[]
}
type NewKeep = { path: string; value: unknown }
type NewStrike = { key: string; reason: string }

export type ReadingQueue = ReturnType<typeof createReadingQueue>

const usualPauses = [1000, 2000, 5000, 10_000, 30_000]
/** Refusals that trying again does not change. */
const final: readonly Refusal['code'][] = ['not-now', 'not-allowed', 'not-found', 'too-large']
/** At most so many things in one request. */
const mostAtOnce = 200

/**
 * Brings what is kept at the bench to the server: into the browser's store first, then over the line until the server has it.
 * A reading has a key of its own, so that sending it again keeps it once; a save on an older version fetches the run and tries again.
 */
export function createReadingQueue({ store, run: first, send, refetch, onRun, now = Date.now, pauses = usualPauses }: Given) {
  let run = first
  let state: QueueState = { kept: first.readings, unsent: [], going: 'idle', problem: '', keptAt: null, clashes: new Set(), refused: {}, isStored: true }
  const listeners = new Set<() => void>()
  let busy = false
  let closed = false
  let failures = 0
  let last = 0
  let timer: ReturnType<typeof setTimeout> | undefined

  function set(change: Partial<QueueState>): void {
    const unsent = change.unsent ?? state.unsent
    state = { ...state, ...change, kept: run.readings, clashes: clashing(run.readings, unsent) }
    for (const listener of listeners) listener()
  }
  /** The clock, never standing still, so that order survives the store. */
  const moment = () => (last = Math.max(last + 1, now()))

  async function open(): Promise<void> {
    closed = false
    const found = await store.all(run.id).catch(() => { set({ isStored: false }); return [] })
    const here = new Set(state.unsent.map(nameOf))
    set({ unsent: [...found.filter((item) => !here.has(nameOf(item))), ...state.unsent] })
    await settle()
    await push()
  }

  async function put(items: Unsent[]): Promise<void> {
    set({ unsent: [...state.unsent, ...items] })
    await stored(items)
    if (state.going === 'stopped') set({ going: 'idle' })
    await push()
  }

  /** A full disk must not keep a reading from the server. */
  async function stored(items: readonly Unsent[]): Promise<void> {
    try {
      await store.put(items)
    } catch {
      set({ isStored: false })
    }
  }

  /** What stays behind by a fault is known by its key and left out the next time. */
  async function removed(items: readonly Unsent[]): Promise<void> {
    await store.remove(items).catch(() => set({ isStored: false }))
  }

  /** Leaves out what the server has, by key. */
  async function settle(): Promise<void> {
    const known = new Map(run.readings.map((reading) => [reading.key, reading]))
    const there = state.unsent.filter(({ kind, key }) => (kind === 'keep' ? known.has(key) : Boolean(known.get(key)?.struck)))
    if (there.length === 0) return set({})
    set({ unsent: state.unsent.filter((item) => !there.includes(item)), keptAt: now() })
    await removed(there)
  }

  async function see(fresh: TestRun): Promise<void> {
    if (fresh.id !== run.id || fresh.version < run.version) return
    run = fresh
    await settle()
  }

  function ready(): Unsent[] {
    const held = (key: string) => state.clashes.has(key) || state.refused[key] !== undefined
    return state.unsent.filter(({ key }) => !held(key)).slice(0, mostAtOnce)
  }

  async function push(): Promise<void> {
    if (busy || closed || state.going === 'stopped') return
    clearTimeout(timer)
    const batch = ready()
    if (batch.length === 0) return set({ going: 'idle', problem: '' })
    busy = true
    set({ going: 'sending' })
    const wait = await attempt(batch)
    busy = false
    if (wait === null || closed) return
    if (wait === 0) return push()
    timer = setTimeout(() => void push(), wait)
  }

  /** One attempt; gives the pause before the next in ms, or null when there is to be none. */
  async function attempt(batch: readonly Unsent[]): Promise<number | null> {
    try {
      const keep = batch.flatMap((item) => (item.kind === 'keep' ? [{ key: item.key, path: item.path, value: item.value as SaveReadings['keep'][number]['value'] }] : []))
      const strike = batch.flatMap((item) => (item.kind === 'strike' ? [{ key: item.key, reason: item.reason }] : []))
      const answer = await send({ version: run.version, keep, strike })
      failures = 0
      await see(answer)
      onRun(answer)
      return 0
    } catch (error) {
      return failed(error, batch)
    }
  }

  async function failed(error: unknown, batch: readonly Unsent[]): Promise<number | null> {
    const { code, message, fields } = error instanceof Refusal ? error : new Refusal('unexpected', 'Something went wrong.')
    const again = (words: string) => {
      set({ going: 'waiting', problem: words })
      return pauses[Math.min(failures++, pauses.length - 1)] ?? 30_000
    }
    if (code === 'already-changed') {
      const before = run.version
      try {
        const fresh = await refetch()
        await see(fresh)
        onRun(fresh)
      } catch (unreached) {
        return again(unreached instanceof Error ? unreached.message : message)
      }
      return run.version > before ? 0 : again(message)
    }
    if (code === 'not-acceptable') {
      const said = (item: Unsent) => fields[item.kind === 'keep' ? item.path : `strike.${item.key}`]
      const named = batch.filter((item) => said(item) !== undefined)
      if (named.length > 0) {
        set({ refused: { ...state.refused, ...Object.fromEntries(named.map((item) => [item.key, said(item) ?? message])) } })
        return 0
      }
    } else if (!final.includes(code)) return again(message)
    set({ going: 'stopped', problem: message })
    return null
  }

  return {
    state: () => state,
    subscribe: (listener: () => void) => {
      listeners.add(listener)
      return () => { listeners.delete(listener) }
    },
    open, see,
    /** Keeps readings and strikes others out, together: a replacement is one deed. Gives the new keys. */
    change: async (keep: readonly NewKeep[], strike: readonly NewStrike[] = []): Promise<string[]> => {
      const keeps = keep.map(({ path, value }): Unsent => ({ kind: 'keep', testRunId: run.id, key: crypto.randomUUID(), path, value, at: moment() }))
      const strikes = strike.map(({ key, reason }): Unsent => ({ kind: 'strike', testRunId: run.id, key, reason, at: moment() }))
      await put([...strikes, ...keeps])
      return keeps.map(({ key }) => key)
    },
    /** Gives an unsent reading another place. */
    move: async (key: string, path: string): Promise<void> => {
      const refused = Object.fromEntries(Object.entries(state.refused).filter(([other]) => other !== key))
      const moved = state.unsent.map((item) => (item.kind === 'keep' && item.key === key ? { ...item, path } : item))
      set({ unsent: moved, refused })
      await stored(moved.filter((item) => item.key === key))
      await push()
    },
    /** Gives an unsent reading up; nothing of it reaches the server. */
    drop: async (key: string): Promise<void> => {
      const gone = state.unsent.filter((item) => item.key === key)
      set({ unsent: state.unsent.filter((item) => item.key !== key) })
      await removed(gone)
      await push()
    },
    retry: async (): Promise<void> => {
      if (state.going === 'stopped') set({ going: 'idle' })
      await push()
    },
    close: (): void => {
      closed = true
      clearTimeout(timer)
    },
  }
}
