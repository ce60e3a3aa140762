/** A symbol as it is written by hand: "Rp0.2", "Rm" and "Agt" with their index below, "A" and "HRC" as they are. */
export function SymbolText({ children }: { children: string }) {
  const [, letter, index] = /^([RALS])([prt]\d+(?:[.,]\d+)?|m|eH|eL|gt|g|t|u|o|0)$/.exec(children) ?? []
  if (!letter || !index) return <>{children}</>
  return <>{letter}<sub>{index}</sub></>
}
