import type { Homogeneous } from './bezierPieces'

type Vector = [number, number]

/** How the cubic through given points ends. */
export interface Ends {
  /** tangents at first and last point, where the drawing gives them; else the curvature is 0 there */
  start: Vector | null
  end: Vector | null
  /** first and last point are one, and the curve runs through it smoothly */
  periodic: boolean
}

/** Parameters of the points by the power of the chords between them: 1 chord length, ½ centripetal. */
export function parametersBy(power: number, points: readonly Vector[]): number[] {
  const parameters = [0]
  for (let i = 1; i < points.length; i++) {
    const chord = Math.hypot(points[i][0] - points[i - 1][0], points[i][1] - points[i - 1][1])
    parameters.push(parameters[i - 1] + chord ** power)
  }
  return parameters
}

/**
 * The twice continuously differentiable cubic through points at given parameters, as Bézier pieces. Its tangents m
 * solve h_i m_{i−1} + 2(h_{i−1} + h_i) m_i + h_{i−1} m_{i+1} = 3(h_i s_{i−1} + h_{i−1} s_i), with h the steps of
 * the parameter and s the slopes of the chords (standard cubic spline interpolation).
 */
export function interpolate(points: readonly Vector[], parameters: readonly number[], ends: Ends): Homogeneous[] {
  const n = points.length - 1
  const step = (i: number) => parameters[i + 1] - parameters[i]
  const slope = (i: number, c: 0 | 1) => (points[i + 1][c] - points[i][c]) / step(i)
  const tangents = ([0, 1] as const).map((c) => {
    const system = new Tridiagonal(n + 1)
    for (let i = 1; i < n; i++) {
      system.set(
        i,
        step(i),
        2 * (step(i - 1) + step(i)),
        step(i - 1),
        3 * (step(i) * slope(i - 1, c) + step(i - 1) * slope(i, c)),
      )
    }
    if (ends.periodic) {
      const [h, k] = [step(0), step(n - 1)]
      return system.solvePeriodic(h, 2 * (h + k), k, 3 * (h * slope(n - 1, c) + k * slope(0, c)))
    }
    const speedOf = (v: Vector) => v[c] / Math.hypot(...v)
    if (ends.start) system.set(0, 0, 1, 0, speedOf(ends.start) * chordSpeed(points, parameters, 0))
    else system.set(0, 0, 2, 1, 3 * slope(0, c))
    if (ends.end) system.set(n, 0, 1, 0, speedOf(ends.end) * chordSpeed(points, parameters, n - 1))
    else system.set(n, 1, 2, 0, 3 * slope(n - 1, c))
    return system.solve()
  })
  return Array.from({ length: n }, (_, i) => {
    const third = step(i) / 3
    const [a, b] = [points[i], points[i + 1]]
    const [mx, my] = tangents
    const first = [a[0] + third * mx[i], a[1] + third * my[i]]
    const second = [b[0] - third * mx[i + 1], b[1] - third * my[i + 1]]
    return Float64Array.of(a[0], a[1], 1, first[0], first[1], 1, second[0], second[1], 1, b[0], b[1], 1)
  })
}

const chordSpeed = (points: readonly Vector[], parameters: readonly number[], i: number): number =>
  Math.hypot(points[i + 1][0] - points[i][0], points[i + 1][1] - points[i][1]) / (parameters[i + 1] - parameters[i])

/** Greatest distance between points of two curves of as many pieces, at equal shares of each piece. */
export function greatestDistance(one: readonly Homogeneous[], other: readonly Homogeneous[]): number {
  let greatest = 0
  for (let i = 0; i < one.length; i++) {
    const dense = Array.from({ length: 33 }, (_, k) => cubicAt(other[i], k / 32))
    for (let k = 1; k < 8; k++) {
      const [x, y] = cubicAt(one[i], k / 8)
      greatest = Math.max(greatest, Math.min(...dense.map(([u, v]) => Math.hypot(u - x, v - y))))
    }
  }
  return greatest
}

function cubicAt(piece: Homogeneous, t: number): Vector {
  const [a, b, c, d] = [(1 - t) ** 3, 3 * t * (1 - t) ** 2, 3 * t * t * (1 - t), t ** 3]
  return [a * piece[0] + b * piece[3] + c * piece[6] + d * piece[9], a * piece[1] + b * piece[4] + c * piece[7] + d * piece[10]]
}

/** A diagonally dominant system with three diagonals. */
class Tridiagonal {
  private readonly low: Float64Array
  private readonly mid: Float64Array
  private readonly high: Float64Array
  private readonly right: Float64Array

  constructor(private readonly size: number) {
    this.low = new Float64Array(size)
    this.mid = new Float64Array(size)
    this.high = new Float64Array(size)
    this.right = new Float64Array(size)
  }

  set(i: number, low: number, mid: number, high: number, right: number): void {
    this.low[i] = low
    this.mid[i] = mid
    this.high[i] = high
    this.right[i] = right
  }

  solve(right = this.right, size = this.size): Float64Array {
    const mid = this.mid.slice()
    const x = right.slice()
    for (let i = 1; i < size; i++) {
      const f = this.low[i] / mid[i - 1]
      mid[i] -= f * this.high[i - 1]
      x[i] -= f * x[i - 1]
    }
    for (let i = size - 1; i >= 0; i--) x[i] = (x[i] - (i < size - 1 ? this.high[i] * x[i + 1] : 0)) / mid[i]
    return x
  }

  /** Row 0 couples the last unknown but one, and the last unknown equals the first (Sherman–Morrison). */
  solvePeriodic(low: number, mid: number, high: number, right: number): Float64Array {
    const n = this.size - 1
    const coupling = this.high[n - 1]
    this.set(0, 0, 2 * mid, high, right)
    this.mid[n - 1] += (low * coupling) / mid
    this.high[n - 1] = 0
    const u = new Float64Array(n + 1)
    u[0] = -mid
    u[n - 1] = coupling
    const y = this.solve(this.right, n)
    const z = this.solve(u, n)
    const share = (y[0] - (low * y[n - 1]) / mid) / (1 + z[0] - (low * z[n - 1]) / mid)
    const x = y.map((value, i) => value - share * z[i])
    x[n] = x[0]
    return x
  }
}
