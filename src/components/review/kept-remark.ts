const place = (testRunId: string) => `crosshead.review.${testRunId}`

/** A half-written remark outlives a reload of the page, in this browser only. */
export function keptRemark(testRunId: string): string {
  try {
    return sessionStorage.getItem(place(testRunId)) ?? ''
  } catch {
    return ''
  }
}

export function keepRemark(testRunId: string, remark: string): void {
  try {
    if (remark === '') sessionStorage.removeItem(place(testRunId))
    else sessionStorage.setItem(place(testRunId), remark)
  } catch {
    // A browser that keeps nothing loses the remark on a reload; sending it works all the same.
  }
}
