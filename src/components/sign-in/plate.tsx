import { TravellerLine, type LineNode } from '../ui/traveller/traveller-line.tsx'
import { DrawnPiece, pieceMeasures } from './drawn-piece.tsx'
import { drawnSteel, drawnStress, strainAtGreatest } from './pull-curve.ts'

const ground = 456
const left = 96
const across = 900 - 60 - left
const x = (strain: number) => left + (across * strain) / 0.168
const y = (stressMPa: number) => ground - ((ground - 84) * stressMPa) / drawnSteel.strengthMPa
const pieceTop = ground + 38

const stages = [
  { strain: 0, neck: 0, words: 'as machined' },
  { strain: 0.034, neck: 0, words: 'stretching evenly' },
  { strain: strainAtGreatest, neck: 0, words: 'greatest force' },
  { strain: 0.128, neck: 0.62, words: 'necking' },
  { strain: drawnSteel.fracture, neck: 1, words: 'parted' },
]
const proofStrain = drawnSteel.proofMPa / drawnSteel.slopeMPa + 0.002
const levels = [
  { letter: 'R', index: 'm', stress: drawnSteel.strengthMPa, to: strainAtGreatest, label: -9 },
  { letter: 'R', index: 'p0.2', stress: drawnSteel.proofMPa, to: proofStrain, label: 21 },
]
const strains = [...Array.from({ length: 60 }, (_, step) => step * 0.0002), ...Array.from({ length: 185 }, (_, step) => 0.012 + step * 0.0008)].filter((strain) => strain < drawnSteel.fracture)
const curve = `M${[...strains, drawnSteel.fracture].map((strain) => `${x(strain).toFixed(1)} ${y(drawnStress(strain)).toFixed(1)}`).join('L')}`

const line: readonly LineNode[] = [
  { kind: 'end', stage: 'placed', label: 'placed', state: 'done' },
  { kind: 'prep', stage: 'awaiting samples', label: 'received', state: 'done' },
  { kind: 'test', stage: 'in work', label: 'tested', state: 'done' },
  { kind: 'review', stage: 'in review', label: 'reviewed', state: 'done' },
  { kind: 'report', stage: 'reported', label: 'reported', state: 'done' },
  { kind: 'end', stage: 'closed', label: 'closed', state: 'done' },
]

/** A pull from as machined to parted, force above and test piece below, and the line that every piece of work takes. */
export function Plate() {
  return (
    <section aria-label="A tensile test, drawn" className="flex min-w-0 flex-col justify-center gap-7 px-10 pt-4 pb-10 max-list:hidden">
      <svg className="pic max-h-[calc(100vh-140px)]" viewBox="0 0 900 750" role="img" aria-label="A pull from as machined to parted: curve of force above, the test piece below">
        <Scale />
        {levels.map(({ letter, index, stress, to, label }) => (
          <g key={index}>
            <path d={`M${left - 40} ${y(stress)}H${x(to)}`} className="hair dash" />
            <Indexed x={left - 40} y={y(stress) + label} className="lab" letter={letter} index={index} />
          </g>
        ))}
        <path d={curve} className="curve" />
        {stages.map(({ strain, neck, words }, place) => (
          <g key={words}>
            <path d={`M${x(strain)} ${y(drawnStress(strain)) + (place > 0 ? 6 : 0)}V${pieceTop}`} className="hair" />
            <circle cx={x(strain)} cy={y(drawnStress(strain))} r={4} className="node" />
            <DrawnPiece x={x(strain)} top={pieceTop} strain={strain} neck={neck} parted={neck === 1} />
            <text x={x(strain)} y={738} textAnchor="middle" className="ax">{words}</text>
          </g>
        ))}
        <Dimension side={-1} strain={0} index="0" />
        <Dimension side={1} strain={drawnSteel.fracture} parted index="u" />
      </svg>
      <div className="pr-[3%] pl-[10.2%] [&_b]:text-quiet">
        <TravellerLine size="m" nodes={line} times={false} />
      </div>
    </section>
  )
}

function Scale() {
  const ticks = Array.from({ length: 17 }, (_, percent) => `M${x(percent / 100).toFixed(1)} ${ground}v${percent % 5 ? 5 : 9}`).join('')
  return <path d={`M${left} ${ground}H${left + across}${ticks}`} className="hair" />
}

/** The gauge length before and after, dimensioned as on a drawing. */
function Dimension({ side, strain, parted = false, index }: { side: 1 | -1; strain: number; parted?: boolean; index: string }) {
  const { markTop, markBottom } = pieceMeasures(pieceTop, strain, parted)
  const at = x(strain) + 44 * side
  const rail = (height: number) => `M${at - 24 * side} ${height}h${30 * side}`
  return (
    <>
      <path d={`${rail(markTop)}${rail(markBottom)}M${at} ${markTop}V${markBottom}`} className="hair" />
      <Indexed x={at + 10 * side} y={(markTop + markBottom) / 2 + 4} className="ax" anchor={side > 0 ? 'start' : 'end'} letter="L" index={index} />
    </>
  )
}

function Indexed({ letter, index, anchor, ...at }: { x: number; y: number; className: string; letter: string; index: string; anchor?: 'start' | 'end' }) {
  return <text {...at} textAnchor={anchor}>{letter}<tspan className="sub" dy={3}>{index}</tspan></text>
}
