import type { Config } from 'tailwindcss'

const css = (name: string) => `var(--${name})`
const temper = (name: string) => ({ DEFAULT: css(name), edge: css(`${name}-edge`), on: css(`on-${name}`) })

/**
 * The tokens of the look. Colours are CSS variables (src/styles/tokens.css), so the theme changes without new classes.
 * Breakpoints are named by what fits from there up: `max-list:` is where lists become two-line cards, `max-tablet:` the phone.
 */
export default {
  content: [],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: css('paper'),
      sheet: css('sheet'),
      wash: css('wash'),
      shut: css('shut'),
      line: css('line'),
      edge: css('edge'),
      ink: css('ink'),
      quiet: css('quiet'),
      red: { DEFAULT: css('red'), wash: css('red-wash') },
      amber: { DEFAULT: css('amber'), wash: css('amber-wash') },
      straw: temper('straw'),
      gold: temper('gold'),
      bronze: temper('bronze'),
      purple: temper('purple'),
      blue: temper('blue'),
      slate: temper('slate'),
    },
    screens: { tablet: '701px', list: '1024px', desk: '1101px', wide: '1280px' },
    fontFamily: {
      sans: ['Roboto', 'system-ui', 'sans-serif'],
      mono: ['"Roboto Mono"', 'ui-monospace', 'monospace'],
    },
    fontSize: {
      12: ['0.75rem', '1rem'],
      13: ['0.8125rem', '1.125rem'],
      15: ['0.9375rem', '1.375rem'],
      17: ['1.0625rem', '1.5rem'],
      20: ['1.25rem', '1.625rem'],
      26: ['1.625rem', '2rem'],
      34: ['2.125rem', '2.5rem'],
      64: ['4rem', '4rem'],
    },
    fontWeight: { normal: '400', medium: '500', bold: '700' },
    borderRadius: { none: '0', DEFAULT: '2px', full: '50%' },
    boxShadow: { none: 'none', float: css('float') },
    transitionDuration: { DEFAULT: '120ms', quick: '120ms', move: '200ms' },
    transitionTimingFunction: { DEFAULT: 'cubic-bezier(.2, 0, .1, 1)', move: 'cubic-bezier(.2, 0, .1, 1)' },
    extend: {
      spacing: { gutter: css('gutter'), control: css('control'), small: css('small'), touch: '2.75rem' },
      maxWidth: { page: '1504px', side: '328px', dialog: '480px' },
    },
  },
} satisfies Config
