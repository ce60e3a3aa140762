import { describe, expect, it, vi } from 'vitest'
import { createReadingQueue } from '../../../src/lib/kept-readings/reading-queue.ts'
import { counting, sheetReadings } from '../../../src/lib/kept-readings/sheet-readings.ts'
import { aReading } from './a-run.ts'
import { aServer, aStore } from './a-server.ts'

type Server = ReturnType<typeof aServer>

function open(server: Server, store = aStore(), first = server.run()) {
  const queue = createReadingQueue({ store, run: first, send: server.send, refetch: server.refetch, onRun: () => undefined, pauses: [5] })
  return { queue, store, opened: queue.open() }
}
const values = (server: Server) => server.run().readings.map(({ value }) => value)
const settled = (server: Server, count: number) => vi.waitFor(() => expect(server.run().readings).toHaveLength(count))

describe('readings on their way to the server', () => {
  it('are in the store before they are sent, and leave it when the server has them', async () => {
    const server = aServer()
    const { queue, store } = open(server)
    server.isAway = true
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    expect([store.size(), queue.state().going]).toEqual([1, 'waiting'])
    server.isAway = false
    await settled(server, 1)
    await vi.waitFor(() => expect([store.size(), queue.state().unsent.length, queue.state().going]).toEqual([0, 0, 'idle']))
    expect(queue.state().keptAt).not.toBeNull()
  })

  it('survive a closed page and arrive once', async () => {
    const server = aServer()
    const { queue, store } = open(server)
    server.isAway = true
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await queue.change([{ path: 'readings.1', value: { value: 31.6 } }])
    queue.close()
    server.isAway = false
    const again = open(server, store)
    await again.opened
    await settled(server, 2)
    expect(values(server)).toEqual([{ value: 31.2 }, { value: 31.6 }])
    expect(store.size()).toBe(0)
  })

  it('are kept once when the answer is lost on the way back', async () => {
    const server = aServer()
    server.losesAnswers = true
    const { queue, store } = open(server)
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await vi.waitFor(() => expect(store.size()).toBe(0))
    expect([values(server), server.saves]).toEqual([[{ value: 31.2 }], 2])
  })

  it('are merged with what another screen kept meanwhile', async () => {
    const server = aServer()
    const first = server.run()
    server.set({ readings: [aReading({ key: 'from-elsewhere', path: 'readings.0', value: { value: 30.9 } })] })
    const { queue } = open(server, aStore(), first)
    await queue.change([{ path: 'readings.1', value: { value: 31.2 } }])
    await settled(server, 2)
    expect(values(server)).toEqual([{ value: 30.9 }, { value: 31.2 }])
  })

  it('are both shown when two screens kept the same row, and neither is lost', async () => {
    const server = aServer()
    const first = server.run()
    server.set({ readings: [aReading({ key: 'from-elsewhere', path: 'readings.0', value: { value: 30.9 } })] })
    const { queue, store } = open(server, aStore(), first)
    const [mine] = await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await vi.waitFor(() => expect([...queue.state().clashes]).toEqual([mine]))
    const shown = sheetReadings(server.run().readings, queue.state())
    expect(shown.map(({ value, clash }) => [value, clash])).toEqual([[{ value: 30.9 }, false], [{ value: 31.2 }, true]])
    expect([counting(shown).length, store.size()]).toEqual([1, 1])
    await queue.move(mine ?? '', 'readings.1')
    await settled(server, 2)
    expect(server.run().readings.map(({ path }) => path)).toEqual(['readings.0', 'readings.1'])
  })

  it('go on with the others while one place is in dispute', async () => {
    const server = aServer()
    const first = server.run()
    server.set({ readings: [aReading({ key: 'from-elsewhere', path: 'readings.0', value: { value: 30.9 } })] })
    const { queue } = open(server, aStore(), first)
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await queue.change([{ path: 'readings.1', value: { value: 31.4 } }])
    await settled(server, 2)
    expect(values(server)).toEqual([{ value: 30.9 }, { value: 31.4 }])
  })

  it('can be left out when they are in dispute', async () => {
    const server = aServer()
    const first = server.run()
    server.set({ readings: [aReading({ key: 'from-elsewhere', path: 'readings.0', value: { value: 30.9 } })] })
    const { queue, store } = open(server, aStore(), first)
    const [mine] = await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await vi.waitFor(() => expect(queue.state().clashes.size).toBe(1))
    await queue.drop(mine ?? '')
    expect([store.size(), queue.state().unsent.length, server.run().readings.length]).toEqual([0, 0, 1])
  })

  it('are replaced in one deed: struck out with a reason, and the new one in its place', async () => {
    const server = aServer()
    const { queue } = open(server)
    const [wrong] = await queue.change([{ path: 'readings.0', value: { value: 13.2 } }])
    await settled(server, 1)
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }], [{ key: wrong ?? '', reason: 'typed wrong' }])
    await settled(server, 2)
    expect(server.run().readings.map(({ value, struck }) => [value, struck?.reason ?? null])).toEqual([[{ value: 13.2 }, 'typed wrong'], [{ value: 31.2 }, null]])
  })

  it('stay on the device, with the reason, when the run is over', async () => {
    const server = aServer()
    server.set({ state: 'recorded' })
    const { queue, store } = open(server)
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    expect([queue.state().going, queue.state().problem, store.size()]).toEqual(['stopped', 'this run is recorded', 1])
  })

  it('reach the server although the browser keeps nothing, and the sheet says so', async () => {
    const server = aServer()
    const nowhere = { all: () => Promise.reject(new Error('shut')), put: () => Promise.reject(new Error('shut')), remove: () => Promise.reject(new Error('shut')) }
    const queue = createReadingQueue({ store: nowhere, run: server.run(), send: server.send, refetch: server.refetch, onRun: () => undefined, pauses: [5] })
    await queue.open()
    await queue.change([{ path: 'readings.0', value: { value: 31.2 } }])
    await settled(server, 1)
    expect([queue.state().isStored, queue.state().unsent.length]).toEqual([false, 0])
  })
})
