const place = 'crosshead.bench'

/** The bench this browser stands at: the one that was opened last. */
export function myBench(): string | null {
  try {
    return localStorage.getItem(place)
  } catch {
    return null
  }
}

export function rememberBench(benchId: string): void {
  try {
    localStorage.setItem(place, benchId)
  } catch {
    // a browser that keeps nothing asks again
  }
}
