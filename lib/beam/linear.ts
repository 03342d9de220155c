/** A dense symmetric system could not be factored: `free` is a movement that costs no energy. */
export interface Singular {
  free: Float64Array
}

/**
 * Solves K·X = B for a symmetric positive definite dense K (row by row, n × n) and several right sides,
 * by Cholesky's factor of the diagonally scaled matrix. A pivot below 1e-11 of the scaled diagonal means
 * a mechanism; the answer is then the movement with that unknown set to 1.
 */
export function solveSymmetric(k: Float64Array, n: number, sides: Float64Array[]): Float64Array[] | Singular {
  const scale = new Float64Array(n)
  for (let i = 0; i < n; i++) scale[i] = k[i * n + i] > 0 ? 1 / Math.sqrt(k[i * n + i]) : 1
  const l = new Float64Array(n * n)
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++) {
      let sum = k[i * n + j] * scale[i] * scale[j]
      for (let m = 0; m < j; m++) sum -= l[i * n + m] * l[j * n + m]
      if (i !== j) l[i * n + j] = sum / l[j * n + j]
      else if (sum > 1e-11) l[i * n + i] = Math.sqrt(sum)
      else return { free: movementOf(l, n, i, scale) }
    }
  return sides.map((side) => {
    const x = side.map((value, i) => value * scale[i])
    for (let i = 0; i < n; i++) {
      for (let m = 0; m < i; m++) x[i] -= l[i * n + m] * x[m]
      x[i] /= l[i * n + i]
    }
    for (let i = n - 1; i >= 0; i--) {
      for (let m = i + 1; m < n; m++) x[i] -= l[m * n + i] * x[m]
      x[i] /= l[i * n + i]
    }
    return x.map((value, i) => value * scale[i])
  })
}

/** The null movement of the leading (pivot + 1)-block: L₁₁ᵀ·y = −l, unknown `pivot` = 1. */
function movementOf(l: Float64Array, n: number, pivot: number, scale: Float64Array): Float64Array {
  const y = new Float64Array(n)
  y[pivot] = 1
  for (let i = pivot - 1; i >= 0; i--) {
    let sum = -l[pivot * n + i]
    for (let m = i + 1; m < pivot; m++) sum -= l[m * n + i] * y[m]
    y[i] = sum / l[i * n + i]
  }
  return y.map((value, i) => value * scale[i])
}
