/** A day where the clocks show this time zone: "2 Mar 2026". */
export function dayWords(at: string, timeZone: string): string {
  const { day, month, year } = partsIn(at, timeZone)
  return `${day} ${month} ${year}`
}

/** Two days as one stretch: "9 to 11 Mar 2026", "30 Mar to 2 Apr 2026", or a single day. */
export function dayRange({ from, to }: { from: string; to: string }, timeZone: string): string {
  const [one, other] = [partsIn(from, timeZone), partsIn(to, timeZone)]
  if (one.year !== other.year) return `${dayWords(from, timeZone)} to ${dayWords(to, timeZone)}`
  if (one.month !== other.month) return `${one.day} ${one.month} to ${dayWords(to, timeZone)}`
  return one.day === other.day ? dayWords(to, timeZone) : `${one.day} to ${dayWords(to, timeZone)}`
}

/** Day and time of day with the zone's offset: "13 Mar 2026, 15:52 UTC+1". */
export function timeWords(at: string, timeZone: string): string {
  const { hour, minute, offset } = partsIn(at, timeZone)
  return `${dayWords(at, timeZone)}, ${hour}:${minute} ${offset.replace('GMT', 'UTC').replace(/\+0$/, '')}`
}

function partsIn(at: string, timeZone: string) {
  const parts = new Intl.DateTimeFormat('en-US', {
    timeZone, day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZoneName: 'shortOffset',
  }).formatToParts(new Date(at))
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((one) => one.type === type)?.value ?? ''
  return { day: part('day'), month: part('month'), year: part('year'), hour: part('hour'), minute: part('minute'), offset: part('timeZoneName') }
}
