import { themes, useTheme } from '../../lib/theme.ts'
import { Icon } from '../ui/icon.tsx'
import { Menu, type MenuItem } from '../ui/feedback/menu.tsx'
import type { StripPage } from './strip-page.ts'

const themeLabels = { light: 'Light', dark: 'Dark', system: 'As the system' }

/** Me: who I am, my own pages, light or dark, sign-out. On narrow screens the pages of the role are in it too. */
export function MeMenu({ name, detail, links = [], pages, onSignOut }: { name: string; detail?: string; links?: readonly StripPage[]; pages: readonly StripPage[]; onSignOut: () => void }) {
  const [theme, choose] = useTheme()
  const me: MenuItem[] = [
    ...(detail ? [{ kind: 'words', label: detail } satisfies MenuItem] : []),
    ...links.map((link) => ({ kind: 'go', label: link.label, to: link.to, current: link.current } satisfies MenuItem)),
    { kind: 'line' },
    { kind: 'one', label: 'Theme', value: theme, choices: themes.map((value) => ({ value, label: themeLabels[value] })), onValue: (value) => choose(themes.find((one) => one === value) ?? 'system') },
    { kind: 'line' },
    { label: 'Sign out', onSelect: onSignOut },
  ]
  const all: MenuItem[] = [...pages.map((page) => ({ kind: 'go', label: page.label, to: page.to, current: page.current, hint: page.count } satisfies MenuItem)), { kind: 'line' }, { kind: 'words', label: name }, ...me]
  return (
    <>
      <span className="flex items-center max-wide:hidden">
        <Menu label="Me" items={me} trigger={<button type="button" aria-label={`Me: ${name}`} className="flex min-h-control items-center gap-1.5 rounded font-medium whitespace-nowrap">{name}<Icon name="down" className="size-3! text-quiet" /></button>} />
      </span>
      <span className="-mr-2.5 flex items-center wide:hidden">
        <Menu label="Menu" items={all} trigger={<button type="button" aria-label="Menu" className="grid size-touch place-items-center rounded"><Icon name="menu" /></button>} />
      </span>
    </>
  )
}
