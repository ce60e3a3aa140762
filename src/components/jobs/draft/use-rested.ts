import { useEffect, useState } from 'react'

/** A value as it was when it last rested for so long. */
export function useRested<T>(value: T, ms: number): T {
  const [rested, setRested] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setRested(value), ms)
    return () => clearTimeout(timer)
  }, [ms, value])
  return rested
}
