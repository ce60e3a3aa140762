import { useEffect, useRef, useState, type ReactNode } from 'react'

/** Scrolls sideways when its content is wider, and only then takes the keyboard's focus. */
export function ScrollSideways({ label, children, className }: { label: string; children: ReactNode; className?: string }) {
  const box = useRef<HTMLDivElement>(null)
  const [wider, setWider] = useState(false)
  useEffect(() => {
    const element = box.current
    if (!element || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(() => setWider(element.scrollWidth > element.clientWidth + 1))
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return (
    <div ref={box} className={`overflow-x-auto ${className ?? ''}`} {...(wider && { tabIndex: 0, role: 'group', 'aria-label': label })}>
      {children}
    </div>
  )
}
