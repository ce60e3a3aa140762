import 'react'

declare module 'react' {
  interface CSSProperties {
    /** Tokens and places handed to CSS by name; React sets them through CSSOM, which a strict style policy allows. */
    [name: `--${string}`]: string | number | undefined
  }
}
