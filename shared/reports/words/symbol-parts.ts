export type SymbolPart = { text: string; below: boolean }

const one = /^([RALSm])([prt]\d+(?:\.\d+)?|m|eH|eL|e|gt|g|t|u|o|0|E)$/

/** A symbol as it is set: "Rp0.2" is R with p0.2 below the line, "ReH/Rm" two such, "HRC" and "A" as they are. */
export function symbolParts(symbol: string): SymbolPart[] {
  return symbol.split('/').flatMap((half, at) => [...(at > 0 ? [{ text: '/', below: false }] : []), ...partsOf(half)])
}

function partsOf(text: string): SymbolPart[] {
  const underscore = /^([^_]+)_(.+)$/.exec(text)
  const [, letter, index] = underscore ?? one.exec(text) ?? []
  return letter && index ? [{ text: letter, below: false }, { text: index, below: true }] : [{ text, below: false }]
}
