import { ARC, BEZIER, type EdgeTable, ELLIPSE } from '../geometry/edges'

/** An edge by its start, middle and end; a closed one by its centre and its size. Enough to tell any two apart. */
export type Curve = [ax: number, ay: number, mx: number, my: number, bx: number, by: number]

/** x' = a·x + c·y + e, y' = b·x + d·y + f */
export type Affine = [a: number, b: number, c: number, d: number, e: number, f: number]

export const map = ([a, b, c, d, e, f]: Affine, x: number, y: number): [number, number] => [a * x + c * y + e, b * x + d * y + f]

/** First `second`, then `first`. */
export function compose(first: Affine, second: Affine): Affine {
  const [a, b, c, d] = first
  const [e, f] = map(first, second[4], second[5])
  return [
    a * second[0] + c * second[1],
    b * second[0] + d * second[1],
    a * second[2] + c * second[3],
    b * second[2] + d * second[3],
    e,
    f,
  ]
}

const isTurn = (sweep: number) => Math.abs(sweep) > 2 * Math.PI - 1e-9

/** c + u·cos t + v·sin t from start to start + sweep, under an affine map. */
export function conic(
  at: Affine,
  c: [number, number],
  u: [number, number],
  v: [number, number],
  start: number,
  sweep: number,
): Curve {
  if (isTurn(sweep)) {
    const [x, y] = map(at, ...c)
    const axes = [u, v].flatMap(([dx, dy]) => [at[0] * dx + at[2] * dy, at[1] * dx + at[3] * dy])
    return [x + Math.hypot(...axes), y, x, y, x + Math.hypot(...axes), y]
  }
  const point = (t: number) =>
    map(at, c[0] + u[0] * Math.cos(t) + v[0] * Math.sin(t), c[1] + u[1] * Math.cos(t) + v[1] * Math.sin(t))
  return [...point(start), ...point(start + sweep / 2), ...point(start + sweep)]
}

export function straight(at: Affine, x0: number, y0: number, x1: number, y1: number): Curve {
  return [...map(at, x0, y0), ...map(at, (x0 + x1) / 2, (y0 + y1) / 2), ...map(at, x1, y1)]
}

/** A polyline's arc: the sagitta is bulge × half the chord, to the right of the chord for a positive bulge. */
export function bulged(at: Affine, x0: number, y0: number, x1: number, y1: number, bulge: number): Curve {
  const mx = (x0 + x1) / 2 + (bulge * (y1 - y0)) / 2
  const my = (y0 + y1) / 2 - (bulge * (x1 - x0)) / 2
  return [...map(at, x0, y0), ...map(at, mx, my), ...map(at, x1, y1)]
}

const HERE: Affine = [1, 0, 0, 1, 0, 0]

/** Edge i of the engine; null for kinds that no other library is asked about. */
export function curveOf({ kind, ends, shape, shapes: s }: EdgeTable, i: number): Curve | null {
  const k = shape[i]
  if (kind[i] === BEZIER) return null
  if (kind[i] === ARC) return conic(HERE, [s[k], s[k + 1]], [s[k + 2], 0], [0, s[k + 2]], s[k + 3], s[k + 4])
  if (kind[i] === ELLIPSE) {
    return conic(HERE, [s[k], s[k + 1]], [s[k + 2], s[k + 3]], [s[k + 4], s[k + 5]], s[k + 6], s[k + 7])
  }
  return straight(HERE, ends[4 * i], ends[4 * i + 1], ends[4 * i + 2], ends[4 * i + 3])
}
