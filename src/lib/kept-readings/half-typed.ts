import * as z from 'zod'

/** What is typed and not kept yet, by field. */
export type Typed = Readonly<Record<string, string>>

const Stored = z.record(z.string(), z.string())
const place = (name: string) => `crosshead.typed.${name}`

/** What was half-typed on a sheet when its page went away. */
export function readTyped(name: string): Typed {
  try {
    return Stored.safeParse(JSON.parse(localStorage.getItem(place(name)) ?? '{}')).data ?? {}
  } catch {
    return {}
  }
}

/** Keeps it through a reload; empty fields leave nothing behind. */
export function writeTyped(name: string, typed: Typed): void {
  const left = Object.fromEntries(Object.entries(typed).filter(([, text]) => text !== ''))
  try {
    if (Object.keys(left).length > 0) localStorage.setItem(place(name), JSON.stringify(left))
    else localStorage.removeItem(place(name))
  } catch {
    // a browser that keeps nothing shows what is typed until it is reloaded
  }
}
