/** The number in what was reported: "31.3" of "31.3 HRC", "8.5" of "G 8.5"; all of it where there is none. */
export function numberIn(reported: string): string {
  return /[-−+]?\d+(?:\.\d+)?/.exec(reported)?.[0] ?? reported
}

/** What stands beside the number in what was reported: "HRC" of "31.3 HRC"; empty where nothing does. */
export function unitIn(reported: string): string {
  return reported.replace(numberIn(reported), '').trim()
}
