/** A page of the strip. `current` marks where I am; `count` says how much waits there. */
export type StripPage = { to: string; label: string; current?: boolean; count?: number }
