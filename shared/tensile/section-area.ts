import { listed } from '../method/listed.ts'
import type { DerivationStep } from '../method/method.ts'
import { mean } from '../statistics/mean.ts'
import { significant } from '../units/significant.ts'
import type { Section } from './tensile-parameters.ts'

/** A value in full precision with the steps that lead to it. */
export type Derived = { value: number; derivation: DerivationStep[] }

/**
 * Original cross-section S0 in mm² (ISO 6892-1, clause 7). Round: π/4 · d² of the mean diameter. Rectangular: the mean of thickness × width
 * section by section, or mean thickness × mean width when they were not measured in pairs.
 * @example sectionArea({ shape: 'round', diametersMm: [10.01, 10, 10] }).value // 78.5922…
 */
export function sectionArea(section: Section): Derived {
  switch (section.shape) {
    case 'round': {
      const diameter = mean(section.diametersMm)
      const value = (Math.PI / 4) * diameter ** 2
      return { value, derivation: [
        ...measured('diameters', section.diametersMm, diameter),
        { text: 'original cross-section', formula: `S0 = π/4 × ${plain(diameter)}²`, clause: 'S0 = π/4 × d0²', value, unit: 'mm2' },
      ] }
    }
    case 'rectangular': {
      const { thicknessesMm, widthsMm } = section
      if (thicknessesMm.length === widthsMm.length) {
        const areas = thicknessesMm.map((thickness, i) => thickness * (widthsMm[i] ?? 0))
        const value = mean(areas)
        const products = thicknessesMm.map((thickness, i) => `${plain(thickness)} × ${plain(widthsMm[i] ?? 0)}`)
        return { value, derivation: [
          { text: areas.length > 1 ? 'original cross-section, mean of the sections' : 'original cross-section',
            formula: areas.length > 1 ? `S0 = (${products.join(' + ')}) / ${areas.length}` : `S0 = ${products.join('')}`, clause: 'S0 = a0 × b0', value, unit: 'mm2' },
        ] }
      }
      const thickness = mean(thicknessesMm)
      const width = mean(widthsMm)
      return { value: thickness * width, derivation: [
        ...measured('thicknesses', thicknessesMm, thickness),
        ...measured('widths', widthsMm, width),
        { text: 'original cross-section', formula: `S0 = ${plain(thickness)} × ${plain(width)}`, clause: 'S0 = a0 × b0', value: thickness * width, unit: 'mm2' },
      ] }
    }
    case 'area':
      return { value: section.areaMm2, derivation: [{ text: 'original cross-section as given', value: section.areaMm2, unit: 'mm2' }] }
  }
}

/** Nothing to say of a single reading; the mean of several. */
export function measured(name: string, values: readonly number[], average: number): DerivationStep[] {
  return values.length > 1 ? [{ text: `mean of the ${name} ${listed(values)}`, value: average, unit: 'mm' }] : []
}

/** A number in a formula: as typed when it is short, otherwise to six figures. */
export function plain(value: number): string {
  const short = String(value)
  return short.length <= 8 && !short.includes('e') ? short : significant(value, 6)
}
