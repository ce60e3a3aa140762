export type ThrowawayServices = {
  /** The superuser's address of an empty database; the roles crosshead_owner and crosshead_app have the same password. */
  databaseUrl: string
  redisUrl: string
  /** Ends both servers and removes their folder. */
  stop: () => Promise<void>
}

export function startThrowawayServices(): Promise<ThrowawayServices>
