import type { Conversion } from '../../../shared/method/picture.ts'
import { Icon } from '../../components/ui/icon.tsx'
import { Pairs } from '../../components/ui/pairs.tsx'

/** Values by published tables, in amber: for orientation, never for acceptance unless agreed. */
export function ConversionsBox({ conversions }: { conversions: readonly Conversion[] }) {
  if (conversions.length === 0) return null
  return (
    <section aria-labelledby="approximate" className="border-t-2 border-amber pt-2.5">
      <h2 id="approximate" className="mb-1.5 flex gap-2 text-15 font-bold text-amber"><Icon name="warning" className="mt-0.75" />Approximate</h2>
      {conversions.map(({ table, caution, values }) => (
        <div key={table}>
          <Pairs look="ruled" className="text-15 [&_dd]:text-17 [&>div:first-child]:border-0" items={values.map(({ scale, reported, informative }) => [scaleName(scale), <>≈ {reported}{informative ? <span className="unit"> informative</span> : null}</>])} />
          <p className="mt-1.5 text-13 text-quiet">By {table}. {caution}</p>
        </div>
      ))}
    </section>
  )
}

/** Tables name a strength by its key; people by its words. */
function scaleName(scale: string): string {
  return scale === 'tensileStrengthMPa' ? 'Tensile strength' : scale === 'HV' ? 'Vickers' : scale === 'HBW' ? 'Brinell' : scale
}
