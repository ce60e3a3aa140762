export const rockwellScales = [
  'HRA', 'HRBW', 'HRC', 'HRD', 'HREW', 'HRFW', 'HRGW', 'HRHW', 'HRKW', 'HR15N', 'HR30N', 'HR45N', 'HR15TW', 'HR30TW', 'HR45TW',
] as const
export type RockwellScale = (typeof rockwellScales)[number]

/** What a scale is made of: HR = N − h/S, with h the permanent depth in mm. */
export type ScaleFacts = {
  indenter: 'cone' | 'ball'
  ballDiameterMm?: number
  preliminaryForceKgf: 3 | 10
  totalForceKgf: number
  /** N of HR = N − h/S: the reading at zero depth. */
  zeroDepth: 100 | 130
  /** S of HR = N − h/S: the depth of one unit, mm. */
  unitMm: 0.001 | 0.002
  /** Hardness that the scale is meant for (ISO 6508-1:2016, table of scales, from memory; E18 is used alike). */
  from: number
  to: number
}

const cone = { indenter: 'cone', preliminaryForceKgf: 10, zeroDepth: 100, unitMm: 0.002 } as const
const ball16 = { indenter: 'ball', ballDiameterMm: 1.5875, preliminaryForceKgf: 10, zeroDepth: 130, unitMm: 0.002 } as const
const ball8 = { ...ball16, ballDiameterMm: 3.175 } as const
const superficialCone = { indenter: 'cone', preliminaryForceKgf: 3, zeroDepth: 100, unitMm: 0.001 } as const
const superficialBall = { ...superficialCone, indenter: 'ball', ballDiameterMm: 1.5875 } as const

export const rockwellScale: Record<RockwellScale, ScaleFacts> = {
  HRA: { ...cone, totalForceKgf: 60, from: 20, to: 95 },
  HRBW: { ...ball16, totalForceKgf: 100, from: 10, to: 100 },
  HRC: { ...cone, totalForceKgf: 150, from: 20, to: 70 },
  HRD: { ...cone, totalForceKgf: 100, from: 40, to: 77 },
  HREW: { ...ball8, totalForceKgf: 100, from: 70, to: 100 },
  HRFW: { ...ball16, totalForceKgf: 60, from: 60, to: 100 },
  HRGW: { ...ball16, totalForceKgf: 150, from: 30, to: 94 },
  HRHW: { ...ball8, totalForceKgf: 60, from: 80, to: 100 },
  HRKW: { ...ball8, totalForceKgf: 150, from: 40, to: 100 },
  HR15N: { ...superficialCone, totalForceKgf: 15, from: 70, to: 94 },
  HR30N: { ...superficialCone, totalForceKgf: 30, from: 42, to: 86 },
  HR45N: { ...superficialCone, totalForceKgf: 45, from: 20, to: 77 },
  HR15TW: { ...superficialBall, totalForceKgf: 15, from: 67, to: 93 },
  HR30TW: { ...superficialBall, totalForceKgf: 30, from: 29, to: 82 },
  HR45TW: { ...superficialBall, totalForceKgf: 45, from: 10, to: 72 },
}
