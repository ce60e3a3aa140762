import type { Order, OrderSample } from '../api/orders.ts'
import { orderedTests } from './ordered-test.ts'
import { sizeText } from './size-text.ts'

/** Tests named after people keep their capital inside a sentence, and so do abbreviations. */
const keepsCapital = /^(Rockwell|Brinell|Vickers|Knoop|[A-Z][A-Z0-9])/

/** An order in words: "12 samples, 42CrMo4 +QT, bar Ø 60" and "Rockwell HRC, tensile, grain size". Both empty without samples. */
export function wordsFor(order: Pick<Order, 'columns' | 'samples'>): { what: string; tests: string } {
  const { samples } = order
  if (samples.length === 0) return { what: '', tests: '' }
  const count = samples.length === 1 ? '1 sample' : `${samples.length} samples`
  const what = [count, materials(samples), shape(samples)].filter((part) => part !== '').join(', ')
  const labels = distinct(samples.flatMap((sample) => orderedTests(order, sample)).map(({ label }) => label))
  const tests = labels.map((label, at) => (at === 0 || keepsCapital.test(label) ? label : label.charAt(0).toLowerCase() + label.slice(1)))
  return { what, tests: tests.join(', ') }
}

function materials(samples: readonly OrderSample[]): string {
  const names = distinct(samples.map(({ material }) => material).filter((name) => name !== ''))
  return names.length > 2 ? `${names[0]} and ${names.length - 1} more materials` : names.join(' and ')
}

function shape(samples: readonly OrderSample[]): string {
  const [form, ...otherForms] = distinct(samples.map(({ piece }) => piece.form))
  if (form === undefined || otherForms.length > 0) return ''
  const [size, ...otherSizes] = distinct(samples.map(({ piece }) => sizeText(piece)))
  return size && otherSizes.length === 0 ? `${form} ${size}` : form
}

const distinct = <T>(values: readonly T[]): T[] => [...new Set(values)]
