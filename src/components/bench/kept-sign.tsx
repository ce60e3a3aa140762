import type { ReactNode } from 'react'
import type { QueueState } from '../../lib/kept-readings/reading-queue.ts'
import { formatTime } from '../../lib/format.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Icon } from '../ui/icon.tsx'

/** Where the readings are: with the server, on their way, or on this device until it answers. */
export function KeptSign({ state: { unsent, going, keptAt, clashes, refused, problem, isStored }, onRetry, zone }: { state: QueueState; onRetry: () => void; zone: string }) {
  const count = unsent.filter(({ kind }) => kind === 'keep').length || unsent.length
  const here = `${count} ${count === 1 ? 'reading' : 'readings'} kept ${isStored ? 'on this device' : 'on this page only'}`
  const settle = clashes.size + Object.keys(refused).length
  if (settle > 0) return <Sign icon="warning" look="font-medium text-amber">two screens have kept the same place: choose above</Sign>
  if (unsent.length > 0 && going === 'stopped') {
    return <Sign icon="stop" look="text-red">{here}. {sentence(problem)} <Button size="tiny" kind="soft" onClick={onRetry}>Try again</Button></Sign>
  }
  if (unsent.length > 0 && going === 'waiting') return <Sign icon="clock" look="text-amber">waiting for the server, {here}</Sign>
  if (unsent.length > 0) return <Sign icon="clock" look="text-quiet">{here}, being sent</Sign>
  if (!isStored) return <Sign icon="warning" look="text-amber">this browser keeps nothing: do not close the page while the server is away</Sign>
  return <Sign icon="check" look="text-quiet">{keptAt === null ? 'all kept' : `kept ${formatTime(new Date(keptAt), { zone, seconds: true })}`}</Sign>
}

function Sign({ icon, look, children }: { icon: 'check' | 'clock' | 'warning' | 'stop'; look: string; children: ReactNode }) {
  return <span role="status" className={`flex max-w-85 items-center gap-2 max-desk:max-w-40 ${look}`}><Icon name={icon} /><span>{children}</span></span>
}

function sentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`
}
