/** Samples of one job in few words: "samples 01 to 04 and 07", "sample 02". */
export function sampleList(numbers: readonly string[]): string {
  const runs: string[][] = []
  for (const number of numbers) {
    const last = runs.at(-1)
    const own = number.split('-').at(-1) ?? number
    if (last && Number(last.at(-1)) + 1 === Number(own)) last.push(own)
    else runs.push([own])
  }
  const words = runs.flatMap((run) => (run.length > 2 ? [`${run[0]} to ${run.at(-1)}`] : run))
  const last = words.pop()
  return `${numbers.length === 1 ? 'sample' : 'samples'} ${words.length > 0 ? `${words.join(', ')} and ` : ''}${last ?? ''}`
}
