import { useEffect } from 'react'
import type { DefaultValues, FieldValues, UseFormReturn } from 'react-hook-form'
import * as z from 'zod'

const Kept = z.record(z.string(), z.string())
const place = (name: string) => `crosshead.form.${name}`

/** What a form of texts held before the page was reloaded, over what it starts with. Never used for passwords. */
export function keptForm<T extends Record<string, string>>(name: string, initial: T): T {
  try {
    const kept = Kept.safeParse(JSON.parse(sessionStorage.getItem(place(name)) ?? '{}'))
    return kept.success ? Object.assign({}, initial, Object.fromEntries(Object.entries(kept.data).filter(([key]) => key in initial))) : initial
  } catch {
    return initial
  }
}

/** Keeps what is typed until `forget` is called or the browser is closed. */
export function useKeptForm<I extends FieldValues, C, O>(name: string, { watch, reset }: UseFormReturn<I, C, O>): (initial: DefaultValues<I>) => void {
  useEffect(() => {
    const { unsubscribe } = watch((values) => put(name, JSON.stringify(values)))
    return unsubscribe
  }, [name, watch])
  return (initial) => {
    reset(initial)
    put(name, null)
  }
}

function put(name: string, text: string | null): void {
  try {
    if (text === null) sessionStorage.removeItem(place(name))
    else sessionStorage.setItem(place(name), text)
  } catch {
    // A browser that keeps nothing loses the form on a reload; sending it works all the same.
  }
}
