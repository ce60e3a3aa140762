import type { ReactNode } from 'react'
import { classNames } from '../ui/class-names.ts'
import { Icon, type IconName } from '../ui/icon.tsx'

const looks = { good: 'border-ink', caution: 'border-amber text-amber', bad: 'border-red text-red' } as const

/** The answer that people came for, as large as it deserves: sign, words, one sentence. `small` for a second answer on the page. */
export function BigAnswer({ look, icon, title, children, small = false }: { look: keyof typeof looks; icon: IconName; title: string; children: ReactNode; small?: boolean }) {
  const Head = small ? 'h3' : 'h2'
  return (
    <div className="grid grid-cols-[auto_minmax(0,1fr)] items-start gap-6 max-tablet:gap-4">
      <div className={classNames('grid place-items-center border-2 bg-sheet', small ? 'size-12' : 'size-16 max-tablet:size-12', looks[look])}>
        <Icon name={icon} className={small ? 'size-7!' : 'size-9! max-tablet:size-7!'} />
      </div>
      <div>
        <Head className={classNames('font-medium tracking-[-.022em]', small ? 'text-26' : 'mb-2 text-[2.5rem]/11 max-tablet:text-[1.875rem]/9', look === 'bad' && 'text-red')}>{title}</Head>
        <div className={small ? '' : 'text-17'}>{children}</div>
      </div>
    </div>
  )
}
