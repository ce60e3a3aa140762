import type { StepNeed } from '../../method/method.ts'
import { mean } from '../../statistics/mean.ts'
import { sectionArea } from '../section-area.ts'
import type { Section } from '../tensile-parameters.ts'

/** Strength that the frame must be able to overcome, MPa: above that of most quenched and tempered steels. */
const GENEROUS_STRENGTH = 1200

const USUAL: Section = { shape: 'round', diametersMm: [10] }

/** Cutting the blank, machining it, and the pull on a frame with force enough. */
export function steps({ section = USUAL }: { section?: Section }): StepNeed[] {
  const forceKn = Math.ceil((sectionArea(section).value * GENEROUS_STRENGTH) / 1000)
  const grip: Record<string, number> = section.shape === 'round' ? { diameterMm: Number(mean(section.diametersMm).toFixed(2)) } : {}
  return [
    { kind: 'section', capability: 'section', setupMinutes: 5, runMinutes: 15, attended: 'setup', needs: {} },
    { kind: 'machine', capability: 'machine', setupMinutes: 15, runMinutes: section.shape === 'round' ? 40 : 30, attended: 'all', needs: {} },
    { kind: 'pull', capability: 'tensile', setupMinutes: 10, runMinutes: 15, attended: 'all', needs: { forceKn, ...grip } },
  ]
}
