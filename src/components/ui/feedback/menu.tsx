import * as Radix from '@radix-ui/react-dropdown-menu'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'

export type MenuItem =
  | { kind?: 'do'; label: ReactNode; onSelect: () => void; icon?: IconName; hint?: ReactNode; danger?: boolean; /** Why not now; it can be read but not chosen. */ refusal?: string }
  | { kind: 'go'; label: ReactNode; to: string; icon?: IconName; hint?: ReactNode; current?: boolean }
  | { kind: 'tick'; label: ReactNode; checked: boolean; onChange: (checked: boolean) => void }
  | { kind: 'one'; label: string; value: string; choices: readonly { value: string; label: string }[]; onValue: (value: string) => void }
  | { kind: 'line' }
  | { kind: 'words'; label: ReactNode }

/** What floats from a button: `<Menu trigger={<Button icon="dots">More</Button>} label="More" items={[{ label: 'Withdraw', onSelect }]} />`. */
export function Menu({ trigger, items, label, align = 'end' }: { trigger: ReactNode; items: readonly MenuItem[]; label: string; align?: 'start' | 'end' }) {
  return (
    <Radix.Root modal={false}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content aria-label={label} align={align} sideOffset={6} collisionPadding={12} className="on-sheet rise z-30 max-h-(--radix-dropdown-menu-content-available-height) max-w-[calc(100vw-24px)] min-w-52 overflow-y-auto rounded border border-ink bg-sheet py-1.5 shadow-float">
          {items.map((item, place) => <Item key={place} item={item} />)}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}

const row = 'flex min-h-control cursor-pointer items-center gap-2.5 px-4 py-1 no-underline outline-none data-highlighted:bg-wash'

function Item({ item }: { item: MenuItem }) {
  switch (item.kind) {
    case 'line':
      return <Radix.Separator className="my-1.5 h-px bg-line" />
    case 'words':
      return <Radix.Label className="px-4 py-1.5 text-13 text-quiet">{item.label}</Radix.Label>
    case 'tick':
      return (
        <Radix.CheckboxItem className={row} checked={item.checked} onCheckedChange={item.onChange} onSelect={(event) => event.preventDefault()}>
          <Icon name="check" className={item.checked ? undefined : 'invisible'} />
          {item.label}
        </Radix.CheckboxItem>
      )
    case 'one':
      return (
        <Radix.RadioGroup value={item.value} onValueChange={item.onValue} aria-label={item.label}>
          {item.choices.map((choice) => (
            <Radix.RadioItem key={choice.value} value={choice.value} className={row} onSelect={(event) => event.preventDefault()}>
              <Icon name="check" className={choice.value === item.value ? undefined : 'invisible'} />
              {choice.label}
            </Radix.RadioItem>
          ))}
        </Radix.RadioGroup>
      )
    case 'go':
      return (
        <Radix.Item asChild>
          <Link to={item.to} className={classNames(row, item.current && 'font-medium shadow-[inset_3px_0_var(--ink)]')} aria-current={item.current ? 'page' : undefined}>
            {item.icon && <Icon name={item.icon} />}
            <span className="flex-1">{item.label}</span>
            {item.hint && <span className="text-13 text-quiet">{item.hint}</span>}
          </Link>
        </Radix.Item>
      )
    case 'do':
    case undefined:
      return (
        <Radix.Item className={classNames(row, item.danger && 'text-red', item.refusal && 'cursor-not-allowed text-quiet')} aria-disabled={item.refusal ? true : undefined} onSelect={(event) => (item.refusal ? event.preventDefault() : item.onSelect())}>
          {item.icon && <Icon name={item.icon} />}
          <span className="flex-1">
            {item.label}
            {item.refusal && <span className="block max-w-72 text-13">{item.refusal}</span>}
          </span>
          {item.hint && <span className="text-13 text-quiet">{item.hint}</span>}
        </Radix.Item>
      )
  }
}
