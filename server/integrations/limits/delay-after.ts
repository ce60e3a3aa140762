/**
 * Seconds to wait after a number of failed tries: none for the free ones, then 1, 2, 4, 8 … up to the longest.
 * Example: free 5, longest 300: the 6th try waits 1 s, the 9th 8 s, the 15th and all later ones 300 s.
 */
export function delayAfter(failed: number, { free, longest }: { free: number; longest: number }): number {
  if (failed <= free) return 0
  return Math.min(longest, 2 ** Math.min(30, failed - free - 1))
}
