export type Spot = { x: number; y: number }
type Box = { left: number; top: number; right: number; bottom: number }

/** The nearest place for a label beside a point, inside the plot, where it covers no line and no other label; the least covered one where all are. */
export function clearPlace(point: Spot, size: { width: number; height: number }, { lines, taken, plot }: { lines: readonly (readonly Spot[])[]; taken: readonly Box[]; plot: Box }): Box {
  const places = [4, 10, 18, 28, 40].flatMap((away) => [0, 45, 135, 180, 225, 270, 315, 90].map((degrees) => boxAt(point, size, away, (degrees * Math.PI) / 180, plot)))
  const costs = places.map((box) => lines.reduce((sum, line) => sum + crossings(line, box), 0) + taken.filter((other) => overlaps(other, box)).length * 50)
  return places[costs.indexOf(Math.min(...costs))]!
}

/** Angles grow clockwise from the right, as y grows downwards. */
function boxAt({ x, y }: Spot, { width, height }: { width: number; height: number }, away: number, angle: number, plot: Box): Box {
  const middle = { x: x + Math.cos(angle) * (away + width / 2), y: y + Math.sin(angle) * (away + height / 2) }
  const left = Math.min(Math.max(middle.x - width / 2, plot.left + 2), plot.right - width)
  const top = Math.min(Math.max(middle.y - height / 2, plot.top - 3), plot.bottom - height - 1)
  return { left, right: left + width, top, bottom: top + height }
}

const margin = 1.2

function overlaps(a: Box, b: Box): boolean {
  return a.left < b.right + margin && a.right > b.left - margin && a.top < b.bottom + margin && a.bottom > b.top - margin
}

/** How many points of a line, taken every 2 pt, lie in a box. */
function crossings(line: readonly Spot[], box: Box): number {
  let count = 0
  for (let at = 1; at < line.length; at += 1) {
    const [from, to] = [line[at - 1]!, line[at]!]
    if (Math.max(from.x, to.x) < box.left - margin || Math.min(from.x, to.x) > box.right + margin || Math.max(from.y, to.y) < box.top - margin || Math.min(from.y, to.y) > box.bottom + margin) continue
    const steps = Math.max(1, Math.ceil(Math.hypot(to.x - from.x, to.y - from.y) / 2))
    for (let step = 0; step <= steps; step += 1) {
      const [x, y] = [from.x + ((to.x - from.x) * step) / steps, from.y + ((to.y - from.y) * step) / steps]
      if (x > box.left - margin && x < box.right + margin && y > box.top - margin && y < box.bottom + margin) count += 1
    }
  }
  return count
}
