import { lengthOf } from '../evaluate'
import type { Arrangement } from './arrange'
import { noLoops, traceLoops } from './loops'
import { halvesOf, nextRound } from './round'

/** A face of an arrangement much longer than wide. */
export interface Cell {
  area: number
  /** 2A ÷ perimeter */
  width: number
  at: [number, number]
  extent: number
}

/**
 * Faces of the arrangement whose mean width 2A ÷ perimeter is below the limit: where outlines that were meant to touch
 * or to coincide overlap or part by a little.
 */
export function thinCells(a: Arrangement, limit: number): Cell[] {
  const kept = Uint8Array.from({ length: a.count }, (_, u) => (a.countStart[u + 1] > a.countStart[u] ? 1 : 0))
  const loops = noLoops()
  traceLoops(a, halvesOf(kept), nextRound(a, kept), new Uint16Array(a.vertices).fill(2), loops)
  const cells: Cell[] = []
  loops.area.forEach((area, k) => {
    if (!(area > 0)) return
    const [from, to] = [loops.loopStart[k], loops.loopStart[k + 1]]
    const e = loops.edges.ends
    let perimeter = 0
    let extent = 0
    for (let i = from; i < to; i++) {
      perimeter += lengthOf(loops.edges, i)
      extent = Math.max(extent, Math.abs(e[4 * i] - e[4 * from]), Math.abs(e[4 * i + 1] - e[4 * from + 1]))
    }
    const width = (2 * area) / perimeter
    if (width < limit) cells.push({ area, width, at: [e[4 * from], e[4 * from + 1]], extent })
  })
  return cells
}
