import type { Region } from '../../geometry/region'
import type { SparseMatrix } from './cholesky'
import { newQuadrature, type Quadrature, quadratureOf, type Unknowns } from './elements'
import type { Mesh } from './mesh'

/** ∫∇Nᵢ·∇Nⱼ over the metal, and the right sides of both problems. */
export interface System {
  stiffness: SparseMatrix
  /** ∫Nᵢ */
  area: Float64Array
  /** ∫(y·Nᵢ,x − x·Nᵢ,y) about the mesh's own origin */
  twist: Float64Array
}

/** Visits every triangle with its quadrature. */
export function eachTriangle(region: Region, mesh: Mesh, visit: (t: number, quadrature: Quadrature) => void): void {
  const quadrature = newQuadrature()
  for (let t = 0; t < mesh.corner.length / 3; t++) {
    quadratureOf(region, mesh, t, quadrature)
    visit(t, quadrature)
  }
}

/** Sparsity pattern of the second-order elements. */
function patternOf({ count, dof }: Unknowns): { start: Int32Array; column: Int32Array } {
  const triangles = dof.length / 6
  const touching = new Int32Array(count + 1)
  for (const d of dof) touching[d + 1]++
  for (let i = 0; i < count; i++) touching[i + 1] += touching[i]
  const fill = touching.slice()
  const list = new Int32Array(dof.length)
  for (let t = 0; t < triangles; t++) for (let i = 0; i < 6; i++) list[fill[dof[6 * t + i]]++] = t
  const mark = new Int32Array(count).fill(-1)
  const start = new Int32Array(count + 1)
  let column = new Int32Array(count * 12)
  let used = 0
  for (let i = 0; i < count; i++) {
    start[i] = used
    for (let p = touching[i]; p < touching[i + 1]; p++)
      for (let j = 0; j < 6; j++) {
        const d = dof[6 * list[p] + j]
        if (mark[d] === i) continue
        mark[d] = i
        if (used === column.length) {
          const grown = new Int32Array(2 * used)
          grown.set(column)
          column = grown
        }
        column[used++] = d
      }
    column.subarray(start[i], used).sort()
  }
  start[count] = used
  return { start, column: column.slice(0, used) }
}

export function assemble(region: Region, mesh: Mesh, unknowns: Unknowns): System {
  const { count, dof } = unknowns
  const { start, column } = patternOf(unknowns)
  const value = new Float64Array(column.length)
  const area = new Float64Array(count)
  const twist = new Float64Array(count)
  const local = new Float64Array(36)
  const find = (i: number, j: number): number => {
    let [low, high] = [start[i], start[i + 1] - 1]
    while (low < high) {
      const middle = (low + high) >> 1
      if (column[middle] < j) low = middle + 1
      else high = middle
    }
    return low
  }
  eachTriangle(region, mesh, (t, { n, x, y, weight, shape }) => {
    local.fill(0)
    for (let q = 0; q < n; q++)
      for (let i = 0; i < 6; i++) {
        const k = 18 * q + 3 * i
        const d = dof[6 * t + i]
        area[d] += weight[q] * shape[k]
        twist[d] += weight[q] * (y[q] * shape[k + 1] - x[q] * shape[k + 2])
        for (let j = 0; j <= i; j++) {
          const m = 18 * q + 3 * j
          local[6 * i + j] += weight[q] * (shape[k + 1] * shape[m + 1] + shape[k + 2] * shape[m + 2])
        }
      }
    for (let i = 0; i < 6; i++)
      for (let j = 0; j < 6; j++) value[find(dof[6 * t + i], dof[6 * t + j])] += local[6 * Math.max(i, j) + Math.min(i, j)]
  })
  return { stiffness: { n: count, start, column, value }, area, twist }
}

/**
 * The matrix after tying: unknown i becomes `to[i]`, −1 where it is held at 0. Several may become one
 * (a hole's rim moves as a whole).
 */
export function tied(a: SparseMatrix, to: Int32Array, n: number): SparseMatrix {
  // the old rows of each new one, in their order
  const first = new Int32Array(n + 1)
  for (let i = 0; i < a.n; i++) if (to[i] >= 0) first[to[i] + 1]++
  for (let k = 0; k < n; k++) first[k + 1] += first[k]
  const fill = first.slice()
  const rows = new Int32Array(first[n])
  for (let i = 0; i < a.n; i++) if (to[i] >= 0) rows[fill[to[i]]++] = i
  const start = new Int32Array(n + 1)
  const column = new Int32Array(a.column.length)
  const value = new Float64Array(a.column.length)
  const place = new Int32Array(n).fill(-1)
  let used = 0
  for (let k = 0; k < n; k++) {
    start[k] = used
    for (let r = first[k]; r < first[k + 1]; r++)
      for (let p = a.start[rows[r]]; p < a.start[rows[r] + 1]; p++) {
        const j = to[a.column[p]]
        if (j < 0) continue
        if (place[j] < start[k]) {
          place[j] = used
          column[used++] = j
        }
        value[place[j]] += a.value[p]
      }
  }
  start[n] = used
  return { n, start, column: column.slice(0, used), value: value.slice(0, used) }
}
