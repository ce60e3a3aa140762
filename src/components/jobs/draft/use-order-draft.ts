import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useRef, useState } from 'react'
import type { Job } from '../../../../shared/api/jobs.ts'
import type { Order } from '../../../../shared/api/orders.ts'
import { jobQuery, useSaveDraft } from '../../../api/jobs.ts'
import { Refusal } from '../../../lib/refusal.ts'
import { draftOf, orderOf, type DraftState } from './draft-state.ts'
import { began, changed, redone, undone, type History } from './history.ts'
import { forgetDraft, keepDraft, keptDraft } from './kept-draft.ts'

const restMs = 800
const againMs = 5000

export type OrderDraft = {
  state: DraftState
  change: (next: (now: DraftState) => DraftState, mark?: string | null) => void
  undo: () => void
  redo: () => void
  mayUndo: boolean
  /** How far what was typed has come. */
  saving: { busy: boolean; unsaved: boolean; savedAt: number | null; trouble: Refusal | null }
  /** Someone changed the draft elsewhere while it was changed here. */
  conflict: boolean
  keepMine: () => void
  takeTheirs: () => void
  /** Sends what is not there yet; gives the version that the server has, or throws the refusal. */
  save: () => Promise<number>
}

/**
 * The draft on screen: every change is a step that can be undone, is kept in this browser at once, and goes to the server when typing
 * rests. A server out of reach is asked again; a draft that was changed elsewhere is never overwritten without asking.
 */
export function useOrderDraft(job: Job, locked: boolean): OrderDraft {
  const client = useQueryClient()
  const { mutateAsync } = useSaveDraft(job.id)
  const [first] = useState(() => keptDraft(job.id))
  const [history, setHistory] = useState<History<DraftState>>(() => began(first && first.version === job.version ? first.state : draftOf(job.order)))
  const [aside, setAside] = useState(first && first.version !== job.version ? first.state : null)
  const [conflict, setConflict] = useState(aside !== null)
  const [busy, setBusy] = useState(false)
  const [trouble, setTrouble] = useState<Refusal | null>(null)
  const [savedAt, setSavedAt] = useState<number | null>(null)
  const [savedText, setSavedText] = useState(() => textOf(job.order))
  const server = useRef({ version: job.version, text: savedText })
  const latest = useRef(history.now)
  const running = useRef<Promise<number> | null>(null)
  const unsaved = textOf(orderOf(history.now)) !== savedText
  useEffect(() => { latest.current = history.now }, [history.now])

  const onServer = useCallback((version: number, text: string) => {
    server.current = { version, text }
    setSavedText(text)
  }, [])

  const send = useCallback(async (): Promise<number> => {
    const order = orderOf(latest.current)
    const text = textOf(order)
    if (text === server.current.text) return server.current.version
    setBusy(true)
    try {
      const { version } = await mutateAsync({ version: server.current.version, order })
      onServer(version, text)
      setSavedAt(Date.now())
      setTrouble(null)
      if (textOf(orderOf(latest.current)) === text) forgetDraft(job.id)
      else keepDraft(job.id, { version, at: Date.now(), state: latest.current })
      return version
    } catch (error) {
      const refusal = error instanceof Refusal ? error : new Refusal('unexpected', 'The order was not saved.')
      setTrouble(refusal)
      if (refusal.code === 'already-changed') {
        await client.invalidateQueries({ queryKey: jobQuery(job.id).queryKey })
        setConflict(true)
      }
      throw refusal
    } finally {
      setBusy(false)
    }
  }, [client, job.id, mutateAsync, onServer])

  /** One after the other: two that go at once would name the same version, and the second be taken for a change made elsewhere. */
  const save = useCallback((): Promise<number> => {
    const turn = (running.current ?? Promise.resolve(0)).catch(() => 0).then(send)
    running.current = turn
    const over = () => { if (running.current === turn) running.current = null }
    turn.then(over, over)
    return turn
  }, [send])

  const stopped = locked || conflict
  useEffect(() => {
    if (!unsaved || stopped) return
    keepDraft(job.id, { version: server.current.version, at: Date.now(), state: history.now })
    const timer = setTimeout(() => void save().catch(() => undefined), restMs)
    return () => clearTimeout(timer)
  }, [history.now, job.id, save, stopped, unsaved])
  useEffect(() => {
    if (!trouble || !unsaved || stopped || (trouble.code !== 'unreachable' && trouble.code !== 'unavailable')) return
    const timer = setInterval(() => void save().catch(() => undefined), againMs)
    return () => clearInterval(timer)
  }, [save, stopped, trouble, unsaved])

  // changed elsewhere: taken as it is when nothing waits here, asked about otherwise
  useEffect(() => {
    if (running.current || job.version <= server.current.version) return
    const waits = textOf(orderOf(latest.current)) !== server.current.text
    if (waits) return setConflict(true)
    onServer(job.version, textOf(job.order))
    setHistory(began(draftOf(job.order)))
  }, [job, onServer])

  const settle = (state: DraftState) => {
    onServer(job.version, textOf(job.order))
    setHistory(began(state))
    setTrouble(null)
    setConflict(false)
    setAside(null)
  }
  return {
    state: history.now, mayUndo: history.past.length > 0,
    change: useCallback((next, mark = null) => setHistory((now) => changed(now, next(now.now), mark)), []),
    undo: useCallback(() => setHistory(undone), []),
    redo: useCallback(() => setHistory(redone), []),
    saving: { busy, unsaved, savedAt, trouble },
    conflict,
    keepMine: () => settle(aside ?? history.now),
    takeTheirs: () => { forgetDraft(job.id); settle(draftOf(job.order)) },
    save,
  }
}

function textOf(order: Order): string {
  return JSON.stringify({ ...order, samples: order.samples.map(({ heat, lot, material, ...sample }) => ({ heat: heat.trim(), lot: lot.trim(), material: material.trim(), ...sample })) })
}
