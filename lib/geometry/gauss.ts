/** Half of the nodes and weights of ten-point Gauss–Legendre quadrature (Abramowitz & Stegun, table 25.4, from memory). */
const NODES = [0.14887433898163122, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717]
const WEIGHTS = [0.29552422471475287, 0.26926671930999635, 0.21908636251598204, 0.1494513491505806, 0.06667134430868814]

/** Deepest halving: pieces of 2⁻¹⁶ are smooth enough for ten points whatever the weights. */
const DEEPEST = 16

interface Estimate {
  value: number
  /** integral of the magnitude, for the tolerance */
  size: number
}

function tenPoints(f: (t: number) => number, from: number, to: number): Estimate {
  const middle = 0.5 * (from + to)
  const half = 0.5 * (to - from)
  let value = 0
  let size = 0
  for (let j = 0; j < 5; j++) {
    const low = f(middle - half * NODES[j])
    const high = f(middle + half * NODES[j])
    value += WEIGHTS[j] * (low + high)
    size += WEIGHTS[j] * (Math.abs(low) + Math.abs(high))
  }
  return { value: half * value, size: Math.abs(half) * size }
}

function refine(
  f: (t: number) => number,
  from: number,
  to: number,
  whole: Estimate,
  allowed: number,
  offBefore: number,
  depth: number,
): number {
  const middle = 0.5 * (from + to)
  const left = tenPoints(f, from, middle)
  const right = tenPoints(f, middle, to)
  const both = left.value + right.value
  const off = Math.abs(both - whole.value)
  // halving that no longer helps has reached the rounding of f itself
  const stuck = depth > 4 && off > 0.5 * offBefore
  if (depth === DEEPEST || off <= allowed || stuck) return both
  return refine(f, from, middle, left, allowed, off, depth + 1) + refine(f, middle, to, right, allowed, off, depth + 1)
}

/** Integral of a smooth f by ten-point Gauss, halved until it changes by no more than rounding. */
export function integrate(f: (t: number) => number, from: number, to: number): number {
  const whole = tenPoints(f, from, to)
  return refine(f, from, to, whole, 4e-15 * whole.size, Number.POSITIVE_INFINITY, 0)
}
