/** Value of a polynomial (lowest power first) by Horner's rule. */
export function valueAt(polynomial: readonly number[], s: number): number {
  let value = 0
  for (let k = polynomial.length - 1; k >= 0; k--) value = value * s + polynomial[k]
  return value
}

/** The derivative's coefficients. */
export function derivative(polynomial: readonly number[]): number[] {
  return polynomial.slice(1).map((coefficient, k) => coefficient * (k + 1))
}

/** The same polynomial in s − shift: p(s + shift). */
export function shifted(polynomial: readonly number[], shift: number): number[] {
  const out = [...polynomial]
  for (let i = 0; i < out.length - 1; i++) for (let k = out.length - 2; k >= i; k--) out[k] += shift * out[k + 1]
  return out
}

/**
 * Real roots in [low, high], ascending. Between neighbouring roots of the derivative the polynomial is
 * monotone, so bisection finds each root to the last bit. A polynomial that is zero throughout has none.
 */
export function rootsIn(polynomial: readonly number[], low: number, high: number): number[] {
  const size = Math.max(1, Math.abs(low), Math.abs(high))
  const scale = polynomial.reduce((sum, coefficient, k) => sum + Math.abs(coefficient) * size ** k, 0)
  if (scale === 0) return []
  let degree = polynomial.length - 1
  while (degree > 0 && polynomial[degree] === 0) degree--
  if (degree === 0) return []
  const turns = degree === 1 ? [] : rootsIn(derivative(polynomial.slice(0, degree + 1)), low, high)
  const marks = [low, ...turns, high]
  const roots: number[] = []
  const add = (s: number) => {
    if (roots.length === 0 || s > roots[roots.length - 1]) roots.push(s)
  }
  for (let i = 0; i + 1 < marks.length; i++) {
    let [a, b] = [marks[i], marks[i + 1]]
    const fa = valueAt(polynomial, a)
    const fb = valueAt(polynomial, b)
    if (Math.abs(fa) <= 4e-16 * scale) add(a)
    if (fa * fb < 0) {
      for (let middle = (a + b) / 2; middle > a && middle < b; middle = (a + b) / 2) {
        if (valueAt(polynomial, middle) * fa > 0) a = middle
        else b = middle
      }
      add(b)
    }
    if (i + 2 === marks.length && Math.abs(fb) <= 4e-16 * scale) add(marks[i + 1])
  }
  return roots
}
