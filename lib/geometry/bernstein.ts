/**
 * Polynomials on [0, 1] in Bernstein form: coefficients c₀ … cₙ of Σ cᵢ·Bᵢⁿ(t).
 * Products and derivatives after Farouki & Rajan, "Algorithms for polynomials in Bernstein form", 1988 (from memory).
 */
export type Bernstein = number[]

const CHOOSE: number[][] = [[1]]
function choose(n: number, k: number): number {
  for (let row = CHOOSE.length; row <= n; row++) {
    const above = CHOOSE[row - 1]
    CHOOSE.push(Array.from({ length: row + 1 }, (_, j) => (above[j - 1] ?? 0) + (above[j] ?? 0)))
  }
  return CHOOSE[n][k]
}

/** Value at t by de Casteljau's scheme. */
export function valueAt(c: Bernstein, t: number): number {
  const b = c.slice()
  for (let n = b.length - 1; n > 0; n--) for (let i = 0; i < n; i++) b[i] += t * (b[i + 1] - b[i])
  return b[0]
}

export function derivative(c: Bernstein): Bernstein {
  const n = c.length - 1
  return n === 0 ? [0] : Array.from({ length: n }, (_, i) => n * (c[i + 1] - c[i]))
}

export function product(a: Bernstein, b: Bernstein): Bernstein {
  const m = a.length - 1
  const n = b.length - 1
  const c = new Array<number>(m + n + 1).fill(0)
  for (let i = 0; i <= m; i++)
    for (let j = 0; j <= n; j++) c[i + j] += (choose(m, i) * choose(n, j) * a[i] * b[j]) / choose(m + n, i + j)
  return c
}

/** a − b of the same degree. */
export const difference = (a: Bernstein, b: Bernstein): Bernstein => a.map((value, i) => value - b[i])

/** Both halves of the polynomial, each on [0, 1] again. */
export function halves(c: Bernstein): [Bernstein, Bernstein] {
  const n = c.length - 1
  const work = c.slice()
  const left = [work[0]]
  const right = new Array<number>(n + 1)
  right[n] = work[n]
  for (let k = 1; k <= n; k++) {
    for (let i = 0; i <= n - k; i++) work[i] = 0.5 * (work[i] + work[i + 1])
    left.push(work[0])
    right[n - k] = work[n - k]
  }
  return [left, right]
}

function signChanges(c: Bernstein): number {
  let changes = 0
  let last = 0
  for (const value of c) {
    if (value === 0) continue
    if (last !== 0 && value > 0 !== last > 0) changes++
    last = value
  }
  return changes
}

function bisect(c: Bernstein): number {
  const rising = valueAt(c, 1) > 0
  let low = 0
  let high = 1
  for (let step = 0; step < 60; step++) {
    const middle = 0.5 * (low + high)
    const value = valueAt(c, middle)
    if (value === 0) return middle
    if (value > 0 === rising) high = middle
    else low = middle
  }
  return 0.5 * (low + high)
}

function isolate(c: Bernstein, from: number, size: number, roots: number[]): void {
  const changes = signChanges(c)
  if (changes === 0) return
  const first = c[0]
  const last = c[c.length - 1]
  if (changes === 1 && first !== 0 && last !== 0) {
    roots.push(from + size * bisect(c))
    return
  }
  if (size < 1e-15) {
    roots.push(from + 0.5 * size)
    return
  }
  const [left, right] = halves(c)
  const half = 0.5 * size
  isolate(left, from, half, roots)
  if (right[0] === 0) roots.push(from + half)
  isolate(right, from + half, half, roots)
}

/** Roots in the open interval (0, 1), ascending, each once; none for the zero polynomial. */
export function rootsOf(c: Bernstein): number[] {
  const roots: number[] = []
  isolate(c, 0, 1, roots)
  return roots.filter((t, i) => t > 0 && t < 1 && (i === 0 || t - roots[i - 1] > 1e-14))
}
