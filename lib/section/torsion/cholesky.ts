import type { Pattern } from './dissection'

/** A sparse symmetric positive definite matrix: the pattern and its values (both triangles). */
export interface SparseMatrix extends Pattern {
  value: Float64Array
}

/** L of P·A·Pᵀ = L·Lᵀ by columns, diagonal first in each. */
export interface Factor {
  n: number
  order: Int32Array
  start: Int32Array
  row: Int32Array
  value: Float64Array
}

/**
 * Up-looking sparse Cholesky after an elimination tree (Davis, Direct Methods for Sparse Linear Systems, SIAM 2006,
 * §4.1–4.7, from memory). `order[k]` is the old index of the k-th pivot. Null where a pivot is not positive.
 */
export function factor(a: SparseMatrix, order: Int32Array): Factor | null {
  const { n } = a
  const inverse = new Int32Array(n)
  for (let k = 0; k < n; k++) inverse[order[k]] = k
  const parent = new Int32Array(n).fill(-1)
  const ancestor = new Int32Array(n).fill(-1)
  for (let k = 0; k < n; k++) {
    const old = order[k]
    for (let p = a.start[old]; p < a.start[old + 1]; p++) {
      let i = inverse[a.column[p]]
      while (i !== -1 && i < k) {
        const next = ancestor[i]
        ancestor[i] = k
        if (next === -1) parent[i] = k
        i = next
      }
    }
  }
  const mark = new Int32Array(n).fill(-1)
  const stack = new Int32Array(n)
  // pattern of row k of L, topologically ordered, at stack[top … n − 1]
  const reach = (k: number): number => {
    let top = n
    mark[k] = k
    const old = order[k]
    for (let p = a.start[old]; p < a.start[old + 1]; p++) {
      let i = inverse[a.column[p]]
      if (i > k) continue
      let length = 0
      for (; mark[i] !== k; i = parent[i]) {
        stack[length++] = i
        mark[i] = k
      }
      while (length > 0) stack[--top] = stack[--length]
    }
    return top
  }
  const counts = new Int32Array(n).fill(1)
  for (let k = 0; k < n; k++) for (let p = reach(k); p < n; p++) counts[stack[p]]++
  const start = new Int32Array(n + 1)
  for (let k = 0; k < n; k++) start[k + 1] = start[k] + counts[k]
  const row = new Int32Array(start[n])
  const value = new Float64Array(start[n])
  const next = start.slice(0, n)
  const work = new Float64Array(n)
  mark.fill(-1)
  for (let k = 0; k < n; k++) {
    const top = reach(k)
    const old = order[k]
    for (let p = a.start[old]; p < a.start[old + 1]; p++) {
      const i = inverse[a.column[p]]
      if (i <= k) work[i] += a.value[p]
    }
    let d = work[k]
    work[k] = 0
    for (let p = top; p < n; p++) {
      const i = stack[p]
      const lki = work[i] / value[start[i]]
      work[i] = 0
      const end = next[i]
      for (let q = start[i] + 1; q < end; q++) work[row[q]] -= value[q] * lki
      d -= lki * lki
      row[end] = k
      value[end] = lki
      next[i] = end + 1
    }
    if (!(d > 0)) return null
    row[start[k]] = k
    value[start[k]] = Math.sqrt(d)
    next[k] = start[k] + 1
  }
  return { n, order, start, row, value }
}

/** Solves A·x = b. */
export function solve({ n, order, start, row, value }: Factor, b: Float64Array): Float64Array {
  const y = new Float64Array(n)
  for (let k = 0; k < n; k++) y[k] = b[order[k]]
  for (let k = 0; k < n; k++) {
    y[k] /= value[start[k]]
    for (let p = start[k] + 1; p < start[k + 1]; p++) y[row[p]] -= value[p] * y[k]
  }
  for (let k = n - 1; k >= 0; k--) {
    for (let p = start[k] + 1; p < start[k + 1]; p++) y[k] -= value[p] * y[row[p]]
    y[k] /= value[start[k]]
  }
  const x = new Float64Array(n)
  for (let k = 0; k < n; k++) x[order[k]] = y[k]
  return x
}
