/** Millimetres on paper as PDF points. */
export const mm = (value: number) => (value * 72) / 25.4

export const page = { width: mm(210), height: mm(297), left: mm(18), right: mm(194), top: mm(14), bottom: mm(287) } as const
export const width = page.right - page.left

/** The colours of paper, and the temper row with its edges: how far work has come, and nothing else. */
export const ink = '#1E2226'
export const quiet = '#5C6369'
export const hairline = '#D9D6CD'
export const edge = '#7E8285'
export const wash = '#EDEBE4'
export const red = '#B3261E'
export const amber = '#865800'
export const temper = {
  straw: ['#E6CB77', '#8C7326'], gold: ['#CF9D34', '#866015'], bronze: ['#94602F', '#6F4520'], purple: ['#6D4380', '#513061'], blue: ['#2E5F9E', '#1F4677'],
} as const
