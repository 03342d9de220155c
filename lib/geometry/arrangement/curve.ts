import { ARC, BEZIER, type EdgeTable, ELLIPSE, LINE } from '../edges'

const MOST_DEGREE = 64
const scratch = new Float64Array(3 * (MOST_DEGREE + 1))

/** Parameter of edge e's first end: 0 for lines and Béziers, the angle (rad) for arcs and elliptical arcs. */
export function startOf(table: EdgeTable, e: number): number {
  const k = table.shape[e]
  if (table.kind[e] === ARC) return table.shapes[k + 3]
  return table.kind[e] === ELLIPSE ? table.shapes[k + 6] : 0
}

/** Parameter of edge e's second end. */
export function endOf(table: EdgeTable, e: number): number {
  const k = table.shape[e]
  if (table.kind[e] === ARC) return table.shapes[k + 3] + table.shapes[k + 4]
  return table.kind[e] === ELLIPSE ? table.shapes[k + 6] + table.shapes[k + 7] : 1
}

/** Writes x y of the carrier of edge e at parameter t. A line's carrier runs through its ends. */
export function pointAt(table: EdgeTable, e: number, t: number, out: Float64Array): void {
  const s = table.shapes
  const k = table.shape[e]
  switch (table.kind[e]) {
    case LINE: {
      const d = table.ends
      out[0] = d[4 * e] + t * (d[4 * e + 2] - d[4 * e])
      out[1] = d[4 * e + 1] + t * (d[4 * e + 3] - d[4 * e + 1])
      return
    }
    case ARC:
      out[0] = s[k] + s[k + 2] * Math.cos(t)
      out[1] = s[k + 1] + s[k + 2] * Math.sin(t)
      return
    case ELLIPSE: {
      const c = Math.cos(t)
      const n = Math.sin(t)
      out[0] = s[k] + s[k + 2] * c + s[k + 4] * n
      out[1] = s[k + 1] + s[k + 3] * c + s[k + 5] * n
      return
    }
    default:
      bezierJet(table, e, t, out, false)
  }
}

/** Writes x y x′ y′ x″ y″ (derivatives by the parameter) of the carrier of edge e at t. */
export function jetAt(table: EdgeTable, e: number, t: number, out: Float64Array): void {
  const s = table.shapes
  const k = table.shape[e]
  const kind = table.kind[e]
  if (kind === BEZIER) {
    bezierJet(table, e, t, out, true)
    return
  }
  pointAt(table, e, t, out)
  if (kind === LINE) {
    const d = table.ends
    out[2] = d[4 * e + 2] - d[4 * e]
    out[3] = d[4 * e + 3] - d[4 * e + 1]
    out[4] = 0
    out[5] = 0
    return
  }
  out[4] = s[k] - out[0]
  out[5] = s[k + 1] - out[1]
  const c = Math.cos(t)
  const n = Math.sin(t)
  out[2] = kind === ARC ? -s[k + 2] * n : s[k + 4] * c - s[k + 2] * n
  out[3] = kind === ARC ? s[k + 2] * c : s[k + 5] * c - s[k + 3] * n
}

/** De Casteljau in homogeneous coordinates; the last levels give the derivatives (Farin, from memory). */
function bezierJet(table: EdgeTable, e: number, t: number, out: Float64Array, derivatives: boolean): void {
  const s = table.shapes
  const k = table.shape[e] + 2
  const n = s[k - 2]
  const b = scratch
  for (let i = 0; i <= n; i++) {
    const w = s[k + 3 * i + 2]
    b[3 * i] = s[k + 3 * i] * w
    b[3 * i + 1] = s[k + 3 * i + 1] * w
    b[3 * i + 2] = w
  }
  let x1 = 0
  let y1 = 0
  let w1 = 0
  let x2 = 0
  let y2 = 0
  let w2 = 0
  for (let level = n; level > 0; level--) {
    if (derivatives && level === 2) {
      const f = n * (n - 1)
      x2 = f * (b[6] - 2 * b[3] + b[0])
      y2 = f * (b[7] - 2 * b[4] + b[1])
      w2 = f * (b[8] - 2 * b[5] + b[2])
    } else if (derivatives && level === 1) {
      x1 = n * (b[3] - b[0])
      y1 = n * (b[4] - b[1])
      w1 = n * (b[5] - b[2])
    }
    for (let j = 0; j < 3 * level; j++) b[j] += t * (b[j + 3] - b[j])
  }
  const w = b[2]
  out[0] = b[0] / w
  out[1] = b[1] / w
  if (!derivatives) return
  out[2] = (x1 - w1 * out[0]) / w
  out[3] = (y1 - w1 * out[1]) / w
  out[4] = (x2 - 2 * w1 * out[2] - w2 * out[0]) / w
  out[5] = (y2 - 2 * w1 * out[3] - w2 * out[1]) / w
}
