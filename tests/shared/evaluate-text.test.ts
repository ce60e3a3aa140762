import { spawnSync } from 'node:child_process'
import { resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { evaluateText } from '../../shared/evaluate-text.ts'

const good = { tool: 'round', value: '12.345', increment: '0.05', rule: 'half-even' }
const bad = { method: 'rockwell', parameters: {}, readings: [] }

describe('evaluating text', () => {
  it('answers an object with an object and an array with an array, in order', () => {
    expect(evaluateText(JSON.stringify(good))).toEqual({ output: { tool: 'round', rounded: '12.35' }, failed: false })
    const { output, failed } = evaluateText(JSON.stringify([good, bad, good, { tool: 'none' }]))
    expect(output).toMatchObject([{ rounded: '12.35' }, { method: 'rockwell', error: { code: 'invalid-input' } }, { rounded: '12.35' }, { tool: 'none', error: { code: 'unknown-tool' } }])
    expect(failed).toBe(true)
    expect(evaluateText('[]')).toEqual({ output: [], failed: false })
  })
  it.each(['', '  ', '{', 'hello', '[1,', 'NaN', '{"tool":"round",}', '{}{}', '['.repeat(200_000)])('answers text that is no JSON with one error: %j', (text) => {
    const { output, failed } = evaluateText(text)
    expect(output).toMatchObject({ error: { code: 'invalid-input', issues: [{ path: [] }] } })
    expect(failed).toBe(true)
  })
  it('takes a byte order mark', () => {
    expect(evaluateText(`\uFEFF${JSON.stringify(good)}`).failed).toBe(false)
  })
  it('refuses numbers too large for a number', () => {
    expect(evaluateText('{"tool":"summary","values":[1e999]}').output).toMatchObject({ error: { issues: [{ path: ['values', 0] }] } })
  })
  it('takes time in proportion to the number of values', () => {
    const seconds = (count: number) => {
      const text = JSON.stringify({ tool: 'summary', values: Array.from({ length: count }, (_, i) => i % 7) })
      const start = process.cpuUsage().user
      expect(evaluateText(text).failed).toBe(false)
      return (process.cpuUsage().user - start) / 1e6
    }
    seconds(100_000)
    // ten times the values; thirty times the time would be on the way to a square
    expect(seconds(1_000_000)).toBeLessThan(30 * Math.max(0.02, seconds(100_000)))
  }, 60_000)
})

describe('the command line', () => {
  const run = (input: string) => spawnSync(process.execPath, ['--import', 'tsx', 'server/bin/evaluate.ts'], { input, cwd: resolve(import.meta.dirname, '../..'), encoding: 'utf8' })
  it('prints answers and says by its status whether any failed', () => {
    const fine = run(JSON.stringify(good))
    expect([fine.status, fine.stdout]).toEqual([0, '{\n  "tool": "round",\n  "rounded": "12.35"\n}\n'])
    const mixed = run(JSON.stringify([good, bad]))
    expect(mixed.status).toBe(1)
    expect(JSON.parse(mixed.stdout)).toHaveLength(2)
    expect(mixed.stderr).toBe('')
    const none = run('no json')
    expect([none.status, JSON.parse(none.stdout).error.code]).toEqual([1, 'invalid-input'])
  }, 60_000)
})
