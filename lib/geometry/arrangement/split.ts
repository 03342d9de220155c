import { ARC, BEZIER, type EdgeTable, ELLIPSE, pushArc, pushBezier, pushCopy, pushEllipse, pushLine } from '../edges'
import { endOf, startOf } from './curve'

/**
 * Appends the part of edge `row` of `from` between two parameters, walked from ta to tb, with the ends
 * given. Arcs and ellipses keep their centre and axes to the last bit, Béziers are cut by de Casteljau
 * from the original, a whole edge walked forward is copied.
 */
export function pushStretch(
  to: EdgeTable,
  from: EdgeTable,
  row: number,
  ta: number,
  tb: number,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
): number {
  const s = from.shapes
  const k = from.shape[row]
  const source = from.source[row]
  if (ta === startOf(from, row) && tb === endOf(from, row)) {
    const i = pushCopy(to, from, row)
    setEnds(to, i, x0, y0, x1, y1)
    return i
  }
  switch (from.kind[row]) {
    case ARC:
      return pushArc(to, x0, y0, x1, y1, s[k], s[k + 1], s[k + 2], ta, tb - ta, source)
    case ELLIPSE:
      return pushEllipse(to, x0, y0, x1, y1, s[k], s[k + 1], s[k + 2], s[k + 3], s[k + 4], s[k + 5], ta, tb - ta, source)
    case BEZIER: {
      const i = pushBezier(to, s[k], s[k + 1] === 1, bezierStretch(s, k, ta, tb), source)
      setEnds(to, i, x0, y0, x1, y1)
      return i
    }
    default:
      return pushLine(to, x0, y0, x1, y1, source)
  }
}

function setEnds(table: EdgeTable, i: number, x0: number, y0: number, x1: number, y1: number): void {
  table.ends[4 * i] = x0
  table.ends[4 * i + 1] = y0
  table.ends[4 * i + 2] = x1
  table.ends[4 * i + 3] = y1
}

/** Control points x y w of the Bézier at shapes[k] from ta to tb (tb < ta turns it round). */
function bezierStretch(s: Float64Array, k: number, ta: number, tb: number): number[] {
  const n = s[k]
  const low = Math.min(ta, tb)
  const high = Math.max(ta, tb)
  let b: number[] = []
  for (let i = 0; i <= n; i++) {
    const w = s[k + 4 + 3 * i]
    b.push(s[k + 2 + 3 * i] * w, s[k + 3 + 3 * i] * w, w)
  }
  if (high < 1) b = lowerPart(b, high)
  if (low > 0) b = turned(lowerPart(turned(b), 1 - low / high))
  if (tb < ta) b = turned(b)
  for (let i = 0; i <= n; i++) {
    b[3 * i] /= b[3 * i + 2]
    b[3 * i + 1] /= b[3 * i + 2]
  }
  return b
}

/** The control points of the part from 0 to t, homogeneous. */
function lowerPart(control: number[], t: number): number[] {
  const b = [...control]
  const n = b.length / 3 - 1
  for (let level = 1; level <= n; level++) {
    for (let j = n; j >= level; j--) {
      for (let c = 0; c < 3; c++) b[3 * j + c] = (1 - t) * b[3 * (j - 1) + c] + t * b[3 * j + c]
    }
  }
  return b
}

function turned(b: number[]): number[] {
  const out: number[] = []
  for (let i = b.length - 3; i >= 0; i -= 3) out.push(b[i], b[i + 1], b[i + 2])
  return out
}
