const DEEPEST = 52

/**
 * Zeros in the open interval (0, 1) where a polynomial in Bernstein form changes sign, ascending.
 * Halving by de Casteljau; a span whose coefficients have one sign holds none (variation diminishing).
 */
export function bernsteinRoots(coefficients: number[]): number[] {
  const scale = Math.max(...coefficients.map(Math.abs))
  if (!(scale > 0) || coefficients.length < 2) return []
  const found: number[] = []
  search(coefficients, 0, 1, 0, scale * 1e-15, found)
  return found.filter((t) => t > 0 && t < 1)
}

function search(c: number[], a: number, b: number, depth: number, nothing: number, found: number[]): void {
  let changes = 0
  let sign = 0
  for (const v of c) {
    const now = v > nothing ? 1 : v < -nothing ? -1 : 0
    if (now === 0) continue
    if (sign !== 0 && now !== sign) changes++
    sign = now
  }
  if (changes === 0) return
  if (depth >= DEEPEST) {
    const t = (a + b) / 2
    if (found.length === 0 || t - found[found.length - 1] > 1e-12) found.push(t)
    return
  }
  if (changes === 1 && c[0] * c[c.length - 1] < 0) {
    found.push(a + (b - a) * bisect(c))
    return
  }
  const [left, right] = halves(c)
  const middle = (a + b) / 2
  search(left, a, middle, depth + 1, nothing, found)
  if (Math.abs(right[0]) <= nothing && left[0] * right[right.length - 1] < 0) found.push(middle)
  search(right, middle, b, depth + 1, nothing, found)
}

function halves(c: number[]): [number[], number[]] {
  const left: number[] = []
  const right: number[] = []
  let row = c
  while (row.length > 0) {
    left.push(row[0])
    right.unshift(row[row.length - 1])
    row = row.slice(1).map((v, i) => (row[i] + v) / 2)
  }
  return [left, right]
}

function bisect(c: number[]): number {
  let a = 0
  let b = 1
  for (let i = 0; i < DEEPEST + 8 && b - a > 1e-17; i++) {
    const t = (a + b) / 2
    if (t === a || t === b) break
    const v = valueAt(c, t)
    if (v === 0) return t
    if (v > 0 === c[0] > 0) a = t
    else b = t
  }
  return (a + b) / 2
}

function valueAt(c: number[], t: number): number {
  const b = [...c]
  for (let n = b.length - 1; n > 0; n--) {
    for (let j = 0; j < n; j++) b[j] += t * (b[j + 1] - b[j])
  }
  return b[0]
}
