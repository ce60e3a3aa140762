const minute = 60_000
const hour = 60 * minute

/** After this a session ends whatever happens. */
export const absoluteMs = 7 * 24 * hour

/** A session ends when nobody used it for this long; a bench's shared screen sooner. */
export const idleMs = (sharedScreen: boolean | undefined): number => (sharedScreen ? 30 * minute : 12 * hour)
