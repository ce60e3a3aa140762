import { scaleLinear } from 'd3-scale'
import { formatNumber } from '../../../lib/format.ts'
import { classNames } from '../class-names.ts'

export type LimitRuleProps = {
  /** The result; without it only limits and readings are drawn. */
  value?: number | undefined
  lower?: number | undefined
  upper?: number | undefined
  /** Expanded uncertainty, drawn as a grey bar either side. */
  uncertainty?: number | undefined
  readings?: readonly number[]
  /** Places of `readings` that break a rule. */
  bad?: readonly number[]
  unit?: string
  decimals?: number
  /** Fixed scale, so that rows of one requirement can be compared; made from the limits when missing. */
  from?: number
  to?: number
  /** 22 px high and without figures, for table rows. */
  thin?: boolean
  /** Draws the result in red. Taken from value and limits when missing. */
  failed?: boolean
  className?: string
}

/** A number between brackets: brackets are limits, hatching is outside, ticks are readings. Never without the number beside it. */
export function LimitRule({ value, lower, upper, uncertainty, readings = [], bad = [], unit, decimals, from, to, thin = false, failed, className }: LimitRuleProps) {
  const [start, end] = from !== undefined && to !== undefined ? [from, to] : limitScale({ value, lower, upper, uncertainty, readings })
  const scale = scaleLinear([start, end], [0, 100]).clamp(true)
  const at = (number: number) => ({ left: `${scale(number).toFixed(2)}%` })
  const isBad = failed ?? (value !== undefined && ((lower !== undefined && value < lower) || (upper !== undefined && value > upper)))
  const say = (number: number) => formatNumber(number, decimals)
  return (
    <div role="img" aria-label={limitWords({ value, lower, upper, unit, decimals, failed: isBad })} className={classNames('lr', thin && 'thin', isBad && 'bad', className)}>
      <i className="base" />
      {lower !== undefined && <><i className="out" style={{ left: 0, width: `${scale(lower).toFixed(2)}%` }} /><i className="lo" style={at(lower)} /></>}
      {upper !== undefined && <><i className="out" style={{ ...at(upper), right: 0 }} /><i className="hi" style={at(upper)} /></>}
      {value !== undefined && uncertainty !== undefined && uncertainty > 0 && (
        <i className="u" style={{ ...at(value - uncertainty), width: `${(scale(value + uncertainty) - scale(value - uncertainty)).toFixed(2)}%` }} />
      )}
      {readings.map((reading, place) => <i key={place} className={bad.includes(place) ? 'r bad' : 'r'} style={at(reading)} />)}
      {value !== undefined && <i className="m" style={at(value)} />}
      {!thin && lower !== undefined && <span style={at(lower)}>{say(lower)}</span>}
      {!thin && upper !== undefined && <span style={at(upper)}>{say(upper)}</span>}
    </div>
  )
}

/** The scale of a requirement: the limits in the middle five ninths, or two fifths from the side of a single one, and all that is drawn inside. */
export function limitScale({ value, lower, upper, uncertainty = 0, readings = [] }: Pick<LimitRuleProps, 'value' | 'lower' | 'upper' | 'uncertainty' | 'readings'>): [number, number] {
  const drawn = [...readings, ...(value === undefined ? [] : [value - uncertainty, value + uncertainty])]
  const all = [...drawn, ...[lower, upper].filter((limit) => limit !== undefined)]
  if (all.length === 0) return [0, 1]
  const low = Math.min(...all)
  const high = Math.max(...all)
  const span = lower !== undefined && upper !== undefined && upper > lower ? (upper - lower) * 1.8 : (high - low) * 1.9 || Math.abs(high) * 0.2 || 1
  const middle = lower !== undefined && upper !== undefined ? (lower + upper) / 2 : (low + high) / 2
  const room = span * 0.03
  return [Math.min(middle - span / 2, low - room), Math.max(middle + span / 2, high + room)]
}

/** The limits in words: "29.0 to 34.0 HRC", "850 MPa or more", "at most 0.35"; the unit may be left to a column. */
export function limitText(lower: number | undefined, upper: number | undefined, decimals?: number, unit?: string): string {
  const say = (number: number) => formatNumber(number, decimals)
  const withUnit = (number: number) => (unit ? `${say(number)} ${unit}` : say(number))
  if (lower !== undefined && upper !== undefined) return `${say(lower)} to ${withUnit(upper)}`
  if (lower !== undefined) return `${withUnit(lower)} or more`
  if (upper !== undefined) return `at most ${withUnit(upper)}`
  return 'no limits'
}

function limitWords({ value, lower, upper, unit, decimals, failed }: Pick<LimitRuleProps, 'value' | 'lower' | 'upper' | 'unit' | 'decimals'> & { failed: boolean }): string {
  const shown = value === undefined ? 'No result yet' : `${formatNumber(value, decimals)}${unit ? ` ${unit}` : ''}`
  return `${shown}, ${lower === undefined && upper === undefined ? '' : 'limits '}${limitText(lower, upper, decimals)}${failed ? ', not met' : ''}`
}
