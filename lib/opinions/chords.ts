import { ARC, BEZIER, type EdgeTable, ELLIPSE } from '../geometry/edges'

export type Pair = [number, number]

/**
 * Appends the points of edge i without its end: chords that stay within `sagitta` of the curve.
 * Circles are cut on an absolute angle grid, so that equal arcs give equal chords.
 */
export function pushChords(points: Pair[], edges: EdgeTable, i: number, sagitta: number): void {
  const { kind, ends, shape, shapes } = edges
  const k = shape[i]
  points.push([ends[4 * i], ends[4 * i + 1]])
  if (kind[i] === ARC) {
    const r = shapes[k + 2]
    onGrid(shapes[k + 3], shapes[k + 4], stepsPerTurn(r, sagitta), (t) =>
      points.push([shapes[k] + r * Math.cos(t), shapes[k + 1] + r * Math.sin(t)]),
    )
  } else if (kind[i] === ELLIPSE) {
    const [cx, cy, ux, uy, vx, vy, start, sweep] = shapes.subarray(k, k + 8)
    onGrid(start, sweep, stepsPerTurn(Math.hypot(ux, uy, vx, vy), sagitta), (t) =>
      points.push([cx + ux * Math.cos(t) + vx * Math.sin(t), cy + uy * Math.cos(t) + vy * Math.sin(t)]),
    )
  } else if (kind[i] === BEZIER) pushBezier(points, shapes.subarray(k + 2, k + 5 + 3 * shapes[k]), sagitta)
}

/** sagitta = r·(1 − cos(step / 2)); a radius that differs in late digits must give the same grid */
function stepsPerTurn(radius: number, sagitta: number): number {
  const r = Number(radius.toPrecision(9))
  return 8 * Math.ceil(Math.PI / Math.acos(Math.max(0, 1 - sagitta / r)) / 8)
}

function onGrid(start: number, sweep: number, perTurn: number, at: (t: number) => void): void {
  const step = (2 * Math.PI) / perTurn
  const low = Math.min(start, start + sweep) / step
  const high = Math.max(start, start + sweep) / step
  const first = Math.floor(low + 1e-6) + 1
  const last = Math.ceil(high - 1e-6) - 1
  for (let n = 0; n <= last - first; n++) at(step * (sweep > 0 ? first + n : last - n))
}

/** Halves the piece until its control polygon is as flat as asked: the hull property bounds the distance. */
function pushBezier(points: Pair[], xyw: Float64Array, sagitta: number): void {
  const rows: number[][] = []
  for (let j = 0; j < xyw.length; j += 3) rows.push([xyw[j] * xyw[j + 2], xyw[j + 1] * xyw[j + 2], xyw[j + 2]])
  const walk = (control: number[][], depth: number): void => {
    if (depth === 0 || isFlat(control, sagitta)) return
    const [left, right] = halves(control)
    walk(left, depth - 1)
    points.push([right[0][0] / right[0][2], right[0][1] / right[0][2]])
    walk(right, depth - 1)
  }
  walk(rows, 16)
}

function isFlat(control: number[][], sagitta: number): boolean {
  const [ax, ay, aw] = control[0]
  const [bx, by, bw] = control[control.length - 1]
  const dx = bx / bw - ax / aw
  const dy = by / bw - ay / aw
  const length = Math.hypot(dx, dy)
  return control.every(([x, y, w]) => {
    const px = x / w - ax / aw
    const py = y / w - ay / aw
    const along = length > 0 ? Math.min(length, Math.max(0, (px * dx + py * dy) / length)) : 0
    const t = length > 0 ? along / length : 0
    return Math.hypot(px - t * dx, py - t * dy) <= sagitta
  })
}

/** de Casteljau at the middle, in homogeneous coordinates */
function halves(control: number[][]): [number[][], number[][]] {
  const left: number[][] = []
  const right: number[][] = []
  let row = control
  while (row.length > 0) {
    left.push(row[0])
    right.unshift(row[row.length - 1])
    row = row.slice(1).map((next, j) => next.map((value, n) => (value + row[j][n]) / 2))
  }
  return [left, right]
}
