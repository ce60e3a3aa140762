/** The Redis channel on which processes hint that the ledger has grown. */
export const changesChannel = (prefix: string) => `${prefix}:changes`
