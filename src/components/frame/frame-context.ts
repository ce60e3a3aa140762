import { createContext, use, useEffect } from 'react'

/** What a scanned code stands for. */
export type FoundCode = { subject: 'Sample' | 'Job' | 'Report'; id: string; number: string }
/** Whether the page took the code itself. */
export type TakeCode = (found: FoundCode) => boolean

/** What a page may say to the strip. */
export const FrameContext = createContext<{ setHereDetail: (detail: string | undefined) => void; setTakeCode: (take: TakeCode | undefined) => void }>({ setHereDetail: () => {}, setTakeCode: () => {} })

/** Lets a page take scanned codes while it is open: a bench opens the sample's sheet, receiving its row. Without it a code opens its own page. */
export function useTakeCode(take: TakeCode): void {
  const { setTakeCode } = use(FrameContext)
  useEffect(() => {
    setTakeCode(take)
    return () => setTakeCode(undefined)
  }, [take, setTakeCode])
}

/** Names the bench, or whatever is more exactly here, after the site in the strip while the page is open. */
export function useHereDetail(detail: string | undefined): void {
  const { setHereDetail } = use(FrameContext)
  useEffect(() => {
    setHereDetail(detail)
    return () => setHereDetail(undefined)
  }, [detail, setHereDetail])
}
