import { derivative, difference, product } from './bernstein'
import { bezierXy } from './bezierXy'
import { ARC, type EdgeTable, ELLIPSE, emptyTable, LINE, pushCopy, shapeLength } from './edges'
import { jetAt, newJet } from './evaluate'
import { integrate } from './gauss'
import { compensatedSum } from './sum'

/**
 * φ − sin φ without cancellation; φ in rad, any sign. Series of the sine for |φ| ≤ 1 (DLMF, eq. 4.19.1),
 * for φ − sin φ at 1e-4 rad written plainly is off by 3e-8.
 */
export function angleMinusSine(phi: number): number {
  if (Math.abs(phi) > 1) return phi - Math.sin(phi)
  let term = phi ** 3 / 6
  let sum = term
  for (let k = 5; Math.abs(term) > 1e-17 * Math.abs(sum); k += 2) {
    term *= (-phi * phi) / ((k - 1) * k)
    sum += term
  }
  return sum
}

/** ½∮(x dy − y dx) of a polynomial piece relative to its first control point, less its chord's triangle. */
function polynomialSegment(x: number[], y: number[]): number {
  const X = x.map((v) => v - x[0])
  const Y = y.map((v) => v - y[0])
  const integrand = difference(product(X, derivative(Y)), product(Y, derivative(X)))
  return (0.5 * compensatedSum(integrand)) / integrand.length
}

function rationalSegment(edges: EdgeTable, i: number): number {
  const k = edges.shape[i]
  const s = edges.shapes
  const local = emptyTable(1, shapeLength(edges, i))
  pushCopy(local, edges, i)
  for (let j = 0; j <= s[k]; j++) {
    local.shapes[2 + 3 * j] -= s[k + 2]
    local.shapes[3 + 3 * j] -= s[k + 3]
  }
  const jet = newJet()
  const fan = (t: number) => {
    jetAt(local, 0, t, jet)
    return 0.5 * (jet.x * jet.dy - jet.y * jet.dx)
  }
  return integrate(fan, 0, 1)
}

/**
 * Signed area between the chord of edge i and the edge, positive where the edge lies to the right of its chord
 * (a counter-clockwise arc). The area of a loop is the chord polygon's plus these; drawing units².
 * Arc r²(Δ − sin Δ)/2; elliptical arc the same times u × v instead of r² (affine image); polynomial Bézier exact
 * from products in Bernstein form; rational Bézier iterated to rounding.
 */
export function segmentArea(edges: EdgeTable, i: number): number {
  const s = edges.shapes
  const k = edges.shape[i]
  switch (edges.kind[i]) {
    case LINE:
      return 0
    case ARC:
      return 0.5 * s[k + 2] * s[k + 2] * angleMinusSine(s[k + 4])
    case ELLIPSE:
      return 0.5 * (s[k + 2] * s[k + 5] - s[k + 3] * s[k + 4]) * angleMinusSine(s[k + 7])
    default: {
      const curve = bezierXy(edges, i)
      return curve.rational ? rationalSegment(edges, i) : polynomialSegment(curve.x, curve.y)
    }
  }
}

/** Signed area of the loop of edges from … to − 1, positive counter-clockwise; summed about its first point. */
export function loopArea(edges: EdgeTable, from: number, to: number): number {
  const e = edges.ends
  const ox = e[4 * from]
  const oy = e[4 * from + 1]
  let total = 0
  let lost = 0
  for (let i = from; i < to; i++) {
    const ax = e[4 * i] - ox
    const ay = e[4 * i + 1] - oy
    const value = 0.5 * (ax * (e[4 * i + 3] - oy) - ay * (e[4 * i + 2] - ox)) + segmentArea(edges, i)
    const next = total + value
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total
    total = next
  }
  return total + lost
}
