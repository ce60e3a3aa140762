import * as Radix from '@radix-ui/react-dialog'
import { Button } from '../../ui/buttons/button.tsx'
import { Kbd } from '../../ui/kbd.tsx'

const keys: readonly (readonly [string, string])[] = [
  ['N', 'next in the queue'], ['/', 'scan or search'], ['B', 'begin the run, or start the step'], ['Enter', 'keep the reading and go on'], ['↑ ↓', 'through the rows; on a grip 10 MPa, with Shift 1 MPa'], ['S', 'strike out, with a reason'],
  ['D', 'step done'], ['Ctrl Enter', 'record the run'], ['Esc', 'close what is open; back to the row being typed'], ['?', 'all keys'],
]

/** All keys of the bench. */
export function KeysDialog({ onClose }: { onClose: () => void }) {
  return (
    <Radix.Root open onOpenChange={(open) => !open && onClose()}>
      <Radix.Portal>
        <div className="fixed inset-0 z-40 bg-[rgb(21_24_27/0.45)]" aria-hidden />
        <Radix.Content data-modal="" aria-describedby={undefined} className="on-sheet rise fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-32px)] w-[calc(100vw-32px)] max-w-dialog -translate-x-1/2 -translate-y-1/2 overflow-y-auto rounded border border-ink bg-sheet p-6 shadow-float">
          <Radix.Title className="mb-3 text-20 font-medium">Keys at the bench</Radix.Title>
          <dl className="grid grid-cols-[max-content_1fr] gap-x-6 gap-y-2">
            {keys.map(([key, deed]) => <div key={key} className="contents"><dt><Kbd>{key}</Kbd></dt><dd>{deed}</dd></div>)}
          </dl>
          <p className="mt-4 text-13 text-quiet">Letters act outside text. In a grid of numbers a letter is never input, so they act there too.</p>
          <div className="mt-5 text-right"><Radix.Close asChild><Button kind="soft">Close</Button></Radix.Close></div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
