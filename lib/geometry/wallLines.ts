/** A straight line across outlines, with the outlines at its ends. */
export interface AcrossLine {
  chain: number
  a: { x: number; y: number; loop: number }
  b: { x: number; y: number; loop: number }
}

/** Lines that differ by less are parallel, in degrees. */
const PARALLEL = 0.1
/** More parallel lines than this between the same outlines are hatching. Common practice, no source. */
const MOST_WALL_LINES = 16

/**
 * The lines that may be the two sides of walls (webs between the chambers of a profile): those with a parallel one
 * between the same two outlines, or between outlines that are `asked` about anyway. Another line alone is a centre line
 * or a fold, many are hatching drawn as lines.
 */
export function wallLines(lines: AcrossLine[], asked: ReadonlySet<number>): Set<number> {
  const between = new Map<string, { chain: number; degrees: number; fewest: number }[]>()
  for (const { chain, a, b } of lines) {
    const key = `${Math.min(a.loop, b.loop)} ${Math.max(a.loop, b.loop)}`
    const turn = (Math.atan2(b.y - a.y, b.x - a.x) * 180) / Math.PI
    const degrees = (turn + 360 + PARALLEL) % 180
    const fewest = asked.has(a.loop) && asked.has(b.loop) ? 1 : 2
    const own = between.get(key)
    if (own) own.push({ chain, degrees, fewest })
    else between.set(key, [{ chain, degrees, fewest }])
  }
  const walls = new Set<number>()
  for (const own of between.values()) {
    own.sort((p, q) => p.degrees - q.degrees)
    for (let from = 0, to = 0; from < own.length; from = to) {
      while (to < own.length && own[to].degrees - own[from].degrees <= PARALLEL) to++
      if (to - from >= own[from].fewest && to - from <= MOST_WALL_LINES) for (let n = from; n < to; n++) walls.add(own[n].chain)
    }
  }
  return walls
}
