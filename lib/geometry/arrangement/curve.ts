import { ARC, BEZIER, type EdgeTable, ELLIPSE, LINE } from '../edges'
import { newJet, jetAt as unitJetAt } from '../evaluate'

const jet = newJet()

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
      unitJetAt(table, e, t, jet)
      out[0] = jet.x
      out[1] = jet.y
  }
}

/** Writes x y x′ y′ x″ y″ (derivatives by the parameter) of the carrier of edge e at t. */
export function jetAt(table: EdgeTable, e: number, t: number, out: Float64Array): void {
  const s = table.shapes
  const k = table.shape[e]
  const kind = table.kind[e]
  if (kind === BEZIER) {
    unitJetAt(table, e, t, jet)
    out[0] = jet.x
    out[1] = jet.y
    out[2] = jet.dx
    out[3] = jet.dy
    out[4] = jet.ddx
    out[5] = jet.ddy
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
