import { circleThrough } from './chords'
import { type EdgeTable, emptyTable, LINE, pushArc, pushCopy } from './edges'
import { loopArea } from './edgeArea'
import { insertPoint, newGrid, visitNear } from './endGrid'
import type { ArcRun, XY } from './recipe'

export interface WithArcs {
  edges: EdgeTable
  loopStart: Uint32Array
  taken: number
  /** area the arcs add, drawing units² */
  area: number
  missing: ArcRun[]
}

/** A run in a table of loops: rows first … first + chords − 1, wrapping round at the loop's end. */
interface Found {
  run: ArcRun
  first: number
  chords: number
}

/**
 * Replaces accepted runs of chords by arcs through their first, middle and last vertex. Runs are found by these three
 * vertices (within the tolerance), in either sense; runs that are not there come back in `missing`.
 */
export function acceptArcs(edges: EdgeTable, loopStart: Uint32Array, runs: ArcRun[], tolerance: number): WithArcs {
  const found = findRuns(edges, loopStart, runs, tolerance)
  const byFirst = new Map(found.map((f) => [f.first, f]))
  const skipped = new Uint8Array(edges.count)
  const loops = loopOfRows(loopStart)
  for (const { first, chords } of found) for (let n = 1; n < chords; n++) skipped[step(loopStart, loops[first], first, n)] = 1
  const out = emptyTable(edges.count, edges.shapesUsed + 5 * found.length)
  const start = [0]
  let area = 0
  for (let k = 0; k + 1 < loopStart.length; k++) {
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
      const here = byFirst.get(i)
      if (here) pushRun(out, edges, here, step(loopStart, k, i, here.chords - 1))
      else if (!skipped[i]) pushCopy(out, edges, i)
    }
    start.push(out.count)
    if (out.count - start[k] < loopStart[k + 1] - loopStart[k])
      area += loopArea(out, start[k], out.count) - loopArea(edges, loopStart[k], loopStart[k + 1])
  }
  const taken = new Set(found.map(({ run }) => run))
  return {
    edges: out,
    loopStart: Uint32Array.from(start),
    taken: found.length,
    area,
    missing: runs.filter((run) => !taken.has(run)),
  }
}

function loopOfRows(loopStart: Uint32Array): Uint32Array {
  const loops = new Uint32Array(loopStart[loopStart.length - 1])
  for (let k = 0; k + 1 < loopStart.length; k++) loops.fill(k, loopStart[k], loopStart[k + 1])
  return loops
}

const step = (loopStart: Uint32Array, loop: number, row: number, by: number) => {
  const size = loopStart[loop + 1] - loopStart[loop]
  return loopStart[loop] + ((row - loopStart[loop] + by) % size)
}

function findRuns(edges: EdgeTable, loopStart: Uint32Array, runs: ArcRun[], tolerance: number): Found[] {
  const e = edges.ends
  const grid = newGrid(edges.count, 4 * tolerance, e[0], e[1])
  for (let i = 0; i < edges.count; i++) insertPoint(grid, i, e[4 * i], e[4 * i + 1])
  const loops = loopOfRows(loopStart)
  const rowsAt = ([x, y]: XY) => {
    const rows = new Set<number>()
    visitNear(grid, x, y, tolerance, (i) => {
      if (Math.hypot(e[4 * i] - x, e[4 * i + 1] - y) <= tolerance) rows.add(i)
    })
    return rows
  }
  const used = new Uint8Array(edges.count)
  const trace = (first: number, through: Set<number>, to: Set<number>): number => {
    let passed = false
    for (let n = 0; n <= loopStart[loops[first] + 1] - loopStart[loops[first]]; n++) {
      const row = step(loopStart, loops[first], first, n)
      if (n > 0 && to.has(row)) return passed ? n : 0
      if (through.has(row)) passed = true
      if (edges.kind[row] !== LINE || used[row]) return 0
    }
    return 0
  }
  const found: Found[] = []
  for (const run of runs) {
    if (!circleThrough(...run.from, ...run.through, ...run.to)) continue
    const through = rowsAt(run.through)
    for (const [from, to] of [
      [rowsAt(run.from), rowsAt(run.to)],
      [rowsAt(run.to), rowsAt(run.from)],
    ]) {
      const first = [...from].find((row) => trace(row, through, to) > 1)
      if (first === undefined) continue
      const chords = trace(first, through, to)
      for (let n = 0; n < chords; n++) used[step(loopStart, loops[first], first, n)] = 1
      found.push({ run, first, chords })
      break
    }
  }
  return found
}

/** Pushes the arc of a run that ends with row `last`. */
function pushRun(out: EdgeTable, edges: EdgeTable, { run, first }: Found, last: number): void {
  const e = edges.ends
  const [ax, ay, bx, by] = [e[4 * first], e[4 * first + 1], e[4 * last + 2], e[4 * last + 3]]
  const [mx, my] = run.through
  const circle = circleThrough(ax, ay, mx, my, bx, by)
  if (!circle) return
  const from = Math.atan2(ay - circle.y, ax - circle.x)
  const to = Math.atan2(by - circle.y, bx - circle.x)
  const left = (mx - ax) * (by - my) - (my - ay) * (bx - mx) > 0
  const turn = 2 * Math.PI
  const positive = (angle: number) => angle - turn * Math.floor(angle / turn)
  const sweep = left ? positive(to - from) : -positive(from - to)
  pushArc(out, ax, ay, bx, by, circle.x, circle.y, circle.r, from, sweep, edges.source[first])
}
