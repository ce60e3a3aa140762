import { useCallback, useRef, useState } from 'react'
import { readTyped, writeTyped, type Typed } from './half-typed.ts'

/** Half-typed fields that survive a reload: `const [typed, type, clear] = useTyped(run.id)`. The component is keyed by the name. */
export function useTyped(name: string): [Typed, (change: Typed) => void, () => void] {
  const [typed, setTyped] = useState(() => readTyped(name))
  const now = useRef(typed)
  const put = useCallback((next: Typed) => {
    now.current = next
    writeTyped(name, next)
    setTyped(next)
  }, [name])
  const type = useCallback((change: Typed) => put({ ...now.current, ...change }), [put])
  const clear = useCallback(() => put({}), [put])
  return [typed, type, clear]
}
