import { describe, expect, it } from 'vitest'
import { currencySign, formatAmount, formatBytes, formatDay, formatMoney, formatNumber, formatTime, formatWhen, isSameDay } from '../../../src/lib/format.ts'

const gb = { locale: 'en-GB', zone: 'Europe/London' }

describe('numbers and money for people', () => {
  it('has fixed decimals, a true minus sign, and keeps four figures together', () => {
    expect(formatNumber(31, 1, gb)).toBe('31.0')
    expect(formatNumber(-4.25, 2, gb)).toBe('−4.25')
    expect(formatNumber(1130, 0, gb)).toBe('1130')
    expect(formatNumber(205917, 0, gb)).toBe('205,917')
    expect(formatNumber(31.4, 1, { locale: 'de-DE' })).toBe('31,4')
  })

  it('knows how many minor units a currency has', () => {
    expect(formatMoney(95760, 'GBP', gb)).toBe('£957.60')
    expect(formatMoney(957, 'JPY', { locale: 'en-GB' })).toBe('JP¥957')
    expect(formatMoney(-61000, 'GBP', gb)).toBe('−£610.00')
    expect(formatAmount(171120, 'GBP', gb)).toBe('1,711.20')
    expect(currencySign('EUR', gb)).toBe('€')
    expect(formatBytes(1_400_000, gb)).toBe('1.4 MB')
  })
})

describe('times for people', () => {
  it('shows an instant in the zone of the site, a calendar day as it is', () => {
    expect(formatDay('2026-03-13', 'week', { locale: 'en-GB', zone: 'America/Los_Angeles' })).toBe('Fri 13 Mar')
    expect(formatWhen('2026-03-09T16:20:00Z', 'week', gb)).toBe('Mon 9 Mar, 16:20')
    expect(formatTime('2026-03-09T16:20:07Z', { locale: 'en-GB', zone: 'Europe/Berlin', seconds: true })).toBe('17:20:07')
    expect(formatDay('2026-03-09T23:30:00Z', 'short', { locale: 'en-GB', zone: 'Europe/Berlin' })).toBe('10 Mar')
    expect(isSameDay('2026-03-09T23:30:00Z', '2026-03-10T08:00:00Z', 'Europe/Berlin')).toBe(true)
    expect(() => formatDay('soon')).toThrow(RangeError)
  })
})
