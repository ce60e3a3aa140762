/** An amount in minor units for people, such as `€1,234.50`. */
export function money(minor: number, currency: string): string {
  const format = new Intl.NumberFormat('en', { style: 'currency', currency })
  const places = format.resolvedOptions().maximumFractionDigits ?? 2
  return format.format(minor / 10 ** places)
}
