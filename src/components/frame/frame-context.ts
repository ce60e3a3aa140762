import { createContext, use, useEffect } from 'react'

/** What a page may say to the strip. */
export const FrameContext = createContext<{ setHereDetail: (detail: string | undefined) => void }>({ setHereDetail: () => {} })

/** Names the bench, or whatever is more exactly here, after the site in the strip while the page is open. */
export function useHereDetail(detail: string | undefined): void {
  const { setHereDetail } = use(FrameContext)
  useEffect(() => {
    setHereDetail(detail)
    return () => setHereDetail(undefined)
  }, [detail, setHereDetail])
}
