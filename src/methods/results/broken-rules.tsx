import type { Check } from '../../../shared/method/method.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { Kbd } from '../../components/ui/kbd.tsx'
import { classNames } from '../../components/ui/class-names.ts'
import { figureOf } from './figure-of.ts'
import type { SheetViewProps } from '../sheet-view.ts'

/** A rule that is broken, with the rows concerned as keys in order, so that the cure can be pressed. */
type Props = { sheet: SheetViewProps; rowName?: string; /** Key of each row that counts, in order; an empty text for the row being typed. */ rowKeys?: readonly string[]; refill?: (key: string) => Record<string, string>; className?: string }

/** What the readings break, with the cure beside it: errors first, then what a remark has to explain, then what is worth knowing. */
export function BrokenRules({ sheet, rowName = 'reading', rowKeys = [], refill, className }: Props) {
  const { live: { checks, results }, method, locked, strike, without } = sheet
  const errors = checks.filter(({ severity }) => severity === 'error')
  const warnings = checks.filter(({ severity }) => severity === 'warning')
  const infos = checks.filter(({ severity }) => severity === 'info')
  const main = results.find(({ key }) => key === method.mainResult)
  const others = (key: string | undefined) => (main && key ? without(key) : undefined)
  return (
    <div className={classNames('grid content-start gap-3 text-15', className)}>
      {errors.slice(0, 3).map((check, place) => {
        const key = check.reading === undefined ? undefined : rowKeys[check.reading]
        const rest = others(key)
        return (
          <Note
            key={place} kind="bad" title={sentence(firstPart(check))}
            actions={key && !locked ? (
              <>
                <Button size="tiny" className="min-h-touch!" onClick={() => strike(key)}>Strike out {rowName} {(check.reading ?? 0) + 1} {place === errors.length - 1 && <Kbd>S</Kbd>}</Button>
                {refill && <Button size="tiny" kind="soft" className="min-h-touch!" onClick={() => strike(key, refill(key))}>Correct it</Button>}
              </>
            ) : undefined}
          >
            {secondPart(check)} The run cannot be recorded like this.
            {rest && <span className="mt-1 block text-13">Without {rowName} {(check.reading ?? 0) + 1} it is {figureOf(rest.reported).figure}.</span>}
          </Note>
        )
      })}
      {errors.length > 3 && <p className="text-red">{errors.length - 3} more rules are broken.</p>}
      {warnings.length > 0 && (
        <Note kind="warn" live title={warnings.length === 1 ? sentence(warnings[0]?.message ?? '') : `${warnings.length} things a remark has to explain.`}>
          {warnings.length > 1 && <ul className="mt-1 list-disc pl-4">{warnings.slice(0, 6).map(({ message }, place) => <li key={place}>{sentence(message)}</li>)}</ul>}
        </Note>
      )}
      {infos.length > 0 && <Note>{infos.map(({ message }) => sentence(message)).join(' ')}</Note>}
    </div>
  )
}

function firstPart({ message }: Check): string {
  return message.split(': ')[0] ?? message
}
function secondPart({ message }: Check): string {
  const rest = message.split(': ').slice(1).join(': ')
  return rest === '' ? '' : sentence(rest)
}
function sentence(text: string): string {
  const said = text.charAt(0).toUpperCase() + text.slice(1)
  return /[.!?]$/.test(said) ? said : `${said}.`
}
