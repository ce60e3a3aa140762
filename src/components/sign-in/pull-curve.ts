/** The steel of the picture: hard and ductile enough that every stage of a pull can be told from the next. */
export const drawnSteel = { slopeMPa: 206_000, proofMPa: 905, exponent: 31, strengthMPa: 1012, uniform: 0.064, fracture: 0.1595 }

/** Strain at greatest force, elastic part and all. */
export const strainAtGreatest = drawnSteel.uniform + drawnSteel.strengthMPa / drawnSteel.slopeMPa

/** Where the hardening law hands over to the round top of the curve, MPa. */
const joinMPa = 960
const strainOf = (stressMPa: number) => stressMPa / drawnSteel.slopeMPa + 0.002 * (stressMPa / drawnSteel.proofMPa) ** drawnSteel.exponent

/**
 * Stress in MPa of the drawn pull at a strain of 0 to 0.1595: Ramberg–Osgood up to 960 MPa, a cubic with the same slope from there to
 * the strength, then the fall while the neck forms. For the picture at the door only, never for a result. Example: 0.004 gives 811 MPa.
 */
export function drawnStress(strain: number): number {
  const { slopeMPa, proofMPa, exponent, strengthMPa, fracture } = drawnSteel
  const join = strainOf(joinMPa)
  if (strain < join) return stressBelowJoin(strain)
  if (strain < strainAtGreatest) {
    const span = strainAtGreatest - join
    const slope = 1 / (1 / slopeMPa + (0.002 * exponent * (joinMPa / proofMPa) ** exponent) / joinMPa)
    const t = (strain - join) / span
    return (2 * t ** 3 - 3 * t ** 2 + 1) * joinMPa + (t ** 3 - 2 * t ** 2 + t) * span * slope + (3 * t ** 2 - 2 * t ** 3) * strengthMPa
  }
  return strengthMPa * (1 - 0.225 * ((strain - strainAtGreatest) / (fracture - strainAtGreatest)) ** 1.9)
}

function stressBelowJoin(strain: number): number {
  let low = 0
  let high = joinMPa
  for (let step = 0; step < 40; step++) {
    const middle = (low + high) / 2
    if (strainOf(middle) < strain) low = middle
    else high = middle
  }
  return low
}
