export interface GaussRule {
  nodes: Float64Array
  weights: Float64Array
}

const rules = new Map<number, GaussRule>()

/** Legendre polynomial of degree n and its derivative at x, by the three-term recurrence. */
function legendre(n: number, x: number): [number, number] {
  let before = 1
  let value = x
  for (let k = 2; k <= n; k++) [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k]
  return [value, (n * (x * value - before)) / (x * x - 1)]
}

/**
 * Gauss–Legendre rule of n ≥ 2 points on [0, 1], exact for polynomials of degree 2n − 1: roots of the Legendre polynomial
 * by Newton's method, weights 1/((1 − x²)P′(x)²). Source: NIST Digital Library of Mathematical Functions, §3.5(v) (from memory).
 */
export function gaussRule(n: number): GaussRule {
  const known = rules.get(n)
  if (known) return known
  const nodes = new Float64Array(n)
  const weights = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5))
    for (let step = 0; step < 20; step++) {
      const [value, slope] = legendre(n, x)
      x -= value / slope
      if (Math.abs(value / slope) < 1e-16) break
    }
    const [, slope] = legendre(n, x)
    nodes[n - 1 - i] = 0.5 * (1 + x)
    weights[n - 1 - i] = 1 / ((1 - x * x) * slope * slope)
  }
  const rule = { nodes, weights }
  rules.set(n, rule)
  return rule
}
