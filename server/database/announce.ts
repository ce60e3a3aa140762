/** Tells other processes that the ledger has grown. Only a hint: who misses it finds the events a little later. */
type Announce = (ledgerId: number) => void

let announcer: Announce = () => {}

/** Set once when a process starts. */
export function announceWith(announce: Announce): void {
  announcer = announce
}

export const announce: Announce = (ledgerId) => announcer(ledgerId)
