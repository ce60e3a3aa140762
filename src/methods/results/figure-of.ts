/** A reported number in two: the figure with what stands before it, and the unit: "31.5 HRC" is "31.5" and "HRC", "G 8.5" is "G 8.5" and "". */
export function figureOf(reported: string): { figure: string; unit: string } {
  const [, figure = reported, unit = ''] = /^(\D*[−-]?[\d.,]+)\s*(.*)$/u.exec(reported) ?? []
  return { figure, unit }
}
