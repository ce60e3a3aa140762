import { useEffect, useRef, useState } from 'react'
import { classNames } from '../class-names.ts'
import { Icon } from '../icon.tsx'
import { columnName, type Column } from './column.ts'

const restMs = 250

/** The filter in a column's head: words to look for, or a choice. What it says goes into the address when typing rests. */
export function HeadFilter<Row>({ column, value, onValue }: { column: Column<Row>; value: string; onValue: (value: string) => void }) {
  const filter = column.filter
  if (!filter) return null
  const look = classNames('mt-1 flex h-7 items-center gap-1.5 text-13 font-normal', column.numeric && 'justify-end', value ? 'text-ink' : 'text-quiet')
  const name = `Filter by ${columnName(column).toLowerCase()}`
  if (filter.kind === 'text') return <WordsFilter look={look} name={name} words={filter.words} value={value} onValue={onValue} />
  return (
    <span className={look}>
      <select aria-label={name} value={value} onChange={(event) => onValue(event.target.value)} className="h-7 max-w-44 appearance-none truncate bg-transparent pr-4 [field-sizing:content]">
        <option value="" className="bg-sheet text-ink">{filter.all}</option>
        {filter.choices.map((choice) => <option key={choice.value} value={choice.value} className="bg-sheet text-ink">{choice.label}</option>)}
      </select>
      <Icon name="down" className="pointer-events-none -ml-4 size-3!" />
    </span>
  )
}

function WordsFilter({ look, name, words, value, onValue }: { look: string; name: string; words: string; value: string; onValue: (value: string) => void }) {
  const [typed, setTyped] = useState(value)
  const [shown, setShown] = useState(value)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  if (value !== shown) {
    setShown(value)
    setTyped(value)
  }
  useEffect(() => () => clearTimeout(timer.current), [])
  return (
    <span className={look}>
      <Icon name="search" className="size-3!" />
      <input
        type="search"
        aria-label={name}
        placeholder={words}
        value={typed}
        onChange={(event) => {
          const next = event.target.value
          setTyped(next)
          clearTimeout(timer.current)
          timer.current = setTimeout(() => {
            setShown(next.trim())
            onValue(next.trim())
          }, restMs)
        }}
        className="h-7 w-full min-w-24 bg-transparent [&::-webkit-search-cancel-button]:hidden"
      />
    </span>
  )
}
