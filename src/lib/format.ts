/** How a number or a time is shown: the locale of the person (the browser's unless given) and the time zone of the site. */
export type Manner = { locale?: string; zone?: string }

const formats = new Map<string, Intl.NumberFormat | Intl.DateTimeFormat>()
function numberFormat(locale: string | undefined, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  return kept(`n${locale ?? ''}${JSON.stringify(options)}`, () => new Intl.NumberFormat(locale, options))
}
function dateFormat(locale: string | undefined, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  return kept(`d${locale ?? ''}${JSON.stringify(options)}`, () => new Intl.DateTimeFormat(locale, options))
}
/** Making a format costs fifty times its use, and a list uses hundreds; kind and options are in the key. */
function kept<F extends Intl.NumberFormat | Intl.DateTimeFormat>(key: string, make: () => F): F {
  const found = formats.get(key) as F | undefined
  if (found) return found
  const made = make()
  formats.set(key, made)
  return made
}

/** The person's locale, as the browser says it. */
export function locale(): string {
  return typeof navigator === 'undefined' ? 'en-GB' : navigator.language
}

/**
 * A number with fixed decimals, so that columns stand on the decimal point. Without `decimals` it shows up to six. A true minus sign;
 * four figures stay together, as standards write them: 1130 MPa.
 */
export function formatNumber(value: number, decimals?: number, { locale: where = locale() }: Manner = {}): string {
  const digits = decimals === undefined ? { maximumFractionDigits: 6 } : { minimumFractionDigits: decimals, maximumFractionDigits: decimals }
  return numberFormat(where, { ...digits, useGrouping: 'min2' }).format(value).replace('-', '−')
}

/** Minor units of a currency as people write them: `formatMoney(95760, 'GBP')` is "£957.60". */
export function formatMoney(minor: number, currency: string, { locale: where = locale() }: Manner = {}): string {
  return numberFormat(where, { style: 'currency', currency }).format(major(minor, currency)).replace('-', '−')
}

/** The same without the sign of the currency, for columns that say it in their head. */
export function formatAmount(minor: number, currency: string, { locale: where = locale() }: Manner = {}): string {
  const digits = decimalsOf(currency)
  return numberFormat(where, { minimumFractionDigits: digits, maximumFractionDigits: digits }).format(major(minor, currency)).replace('-', '−')
}

/** "£" for GBP. */
export function currencySign(currency: string, { locale: where = locale() }: Manner = {}): string {
  const parts = numberFormat(where, { style: 'currency', currency, currencyDisplay: 'narrowSymbol' }).formatToParts(0)
  return parts.find((part) => part.type === 'currency')?.value ?? currency
}

function decimalsOf(currency: string): number {
  return numberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ?? 2
}
function major(minor: number, currency: string): number {
  return minor / 10 ** decimalsOf(currency)
}

/** How much of a day is said: "13 Mar", "Fri 13 Mar", "Fri 13 Mar 2026", "Friday 13 March". */
export type DayStyle = 'short' | 'week' | 'full' | 'long'
const days: Record<DayStyle, Intl.DateTimeFormatOptions> = {
  short: { day: 'numeric', month: 'short' },
  week: { weekday: 'short', day: 'numeric', month: 'short' },
  full: { weekday: 'short', day: 'numeric', month: 'short', year: 'numeric' },
  long: { weekday: 'long', day: 'numeric', month: 'long' },
}

/** A day, from an instant (in the site's zone) or from a calendar day `2026-03-13` (the same day everywhere). */
export function formatDay(at: string | Date, style: DayStyle = 'week', { locale: where = locale(), zone }: Manner = {}): string {
  const calendar = typeof at === 'string' && /^\d{4}-\d{2}-\d{2}$/.test(at)
  const options = { ...days[style], timeZone: calendar ? 'UTC' : zone }
  // "Fri, 13 Mar" and "Fri 13 Mar" differ between versions of the same locale data; the short ones go without the comma.
  return dateFormat(where, options).format(moment(at)).replace(/^(\p{L}+\.?), /u, '$1 ')
}

/** "10:42", or "10:42:07" with seconds, in the site's zone. */
export function formatTime(at: string | Date, { locale: where = locale(), zone, seconds = false }: Manner & { seconds?: boolean } = {}): string {
  return dateFormat(where, { hour: '2-digit', minute: '2-digit', ...(seconds && { second: '2-digit' }), hourCycle: cycle(where), timeZone: zone }).format(moment(at))
}

/** Day and time together: "Mon 9 Mar, 16:20". */
export function formatWhen(at: string | Date, style: DayStyle = 'week', manner: Manner = {}): string {
  return `${formatDay(at, style, manner)}, ${formatTime(at, manner)}`
}

/** Whether two instants fall on one day at the site. */
export function isSameDay(a: string | Date, b: string | Date, zone?: string): boolean {
  return calendarDay(a, zone) === calendarDay(b, zone)
}

/** The calendar day of an instant at the site, `2026-03-13`, which compares as text. */
export function calendarDay(at: string | Date, zone?: string): string {
  return dateFormat('en-CA', { year: 'numeric', month: '2-digit', day: '2-digit', timeZone: zone }).format(moment(at))
}

/** "1.4 MB", in powers of 1000 as file managers say it. */
export function formatBytes(bytes: number, manner: Manner = {}): string {
  const units = ['B', 'kB', 'MB', 'GB']
  const power = Math.min(units.length - 1, Math.floor(Math.log10(Math.max(1, bytes)) / 3))
  return `${formatNumber(bytes / 1000 ** power, power > 1 ? 1 : 0, manner)} ${units[power] ?? 'B'}`
}

function moment(at: string | Date): Date {
  const date = at instanceof Date ? at : new Date(at)
  if (Number.isNaN(date.getTime())) throw new RangeError(`not a time: ${String(at)}`)
  return date
}
/** "09:20" with its nought where the day has 24 hours; "9:20 am" where people say so. */
function cycle(where: string): 'h12' | 'h23' {
  const found = dateFormat(where, { hour: 'numeric' }).resolvedOptions().hourCycle
  return found === 'h11' || found === 'h12' ? 'h12' : 'h23'
}
