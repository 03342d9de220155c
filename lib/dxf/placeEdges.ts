import { ARC, BEZIER, type EdgeTable, LINE, pushArc, pushBezier, pushEllipse, pushLine } from '../geometry/edges'
import { type Affine, similarityScale } from './affine'
import { LARGEST_NUMBER } from './record'

/**
 * Appends the edges of `from`, mapped; circular arcs stay so under turning, mirroring and equal scale, else they
 * become elliptical arcs. Sources are shifted by `rows`. Answers the first row that would reach beyond 1e12
 * units or lose its numbers, whose edges are left out with all after it; −1 where all went well.
 */
export function placeEdges(into: EdgeTable, from: EdgeTable, map: Affine, rows: number): number {
  const { a, b, c, d, e, f } = map
  const scale = similarityScale(map)
  const mirrored = a * d - b * c < 0
  const turn = Math.atan2(b, a)
  const { ends, shapes } = from
  for (let i = 0; i < from.count; i++) {
    const x0 = a * ends[4 * i] + c * ends[4 * i + 1] + e
    const y0 = b * ends[4 * i] + d * ends[4 * i + 1] + f
    const x1 = a * ends[4 * i + 2] + c * ends[4 * i + 3] + e
    const y1 = b * ends[4 * i + 2] + d * ends[4 * i + 3] + f
    const reach = Math.max(Math.abs(x0), Math.abs(y0), Math.abs(x1), Math.abs(y1))
    if (!(reach <= LARGEST_NUMBER)) return from.source[i]
    const source = rows + from.source[i]
    const k = from.shape[i]
    if (from.kind[i] === LINE) {
      pushLine(into, x0, y0, x1, y1, source)
      continue
    }
    const cx = a * shapes[k] + c * shapes[k + 1] + e
    const cy = b * shapes[k] + d * shapes[k + 1] + f
    if (from.kind[i] === ARC) {
      const radius = shapes[k + 2]
      const start = shapes[k + 3]
      const sweep = shapes[k + 4]
      if (scale > 0) {
        const turned = mirrored ? turn - start : turn + start
        pushArc(into, x0, y0, x1, y1, cx, cy, scale * radius, turned, mirrored ? -sweep : sweep, source)
      } else pushEllipse(into, x0, y0, x1, y1, cx, cy, a * radius, b * radius, c * radius, d * radius, start, sweep, source)
    } else if (from.kind[i] === BEZIER) placeBezier(into, from, i, map, source)
    else {
      const [ux, uy, vx, vy, start, sweep] = shapes.subarray(k + 2, k + 8)
      const mx = a * ux + c * uy
      const my = b * ux + d * uy
      pushEllipse(into, x0, y0, x1, y1, cx, cy, mx, my, a * vx + c * vy, b * vx + d * vy, start, sweep, source)
    }
  }
  return -1
}

function placeBezier(into: EdgeTable, from: EdgeTable, i: number, map: Affine, source: number): void {
  const { shapes, ends } = from
  const k = from.shape[i]
  const degree = shapes[k]
  const xyw = shapes.slice(k + 2, k + 5 + 3 * degree)
  const point = (x: number, y: number): [number, number] => [map.a * x + map.c * y + map.e, map.b * x + map.d * y + map.f]
  for (let j = 0; j < xyw.length; j += 3) xyw.set(point(xyw[j], xyw[j + 1]), j)
  const row = pushBezier(into, degree, shapes[k + 1] === 1, xyw, source)
  into.ends.set([...point(ends[4 * i], ends[4 * i + 1]), ...point(ends[4 * i + 2], ends[4 * i + 3])], 4 * row)
}
