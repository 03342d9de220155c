import { ARC, BEZIER, ELLIPSE, type EdgeTable } from './edges'

function swap(a: Float64Array, i: number, j: number): void {
  const kept = a[i]
  a[i] = a[j]
  a[j] = kept
}

/** Turns edge i of the table round, in place: the same curve walked from its other end. */
export function reverseEdge(edges: EdgeTable, i: number): void {
  swap(edges.ends, 4 * i, 4 * i + 2)
  swap(edges.ends, 4 * i + 1, 4 * i + 3)
  const s = edges.shapes
  const k = edges.shape[i]
  switch (edges.kind[i]) {
    case ARC:
    case ELLIPSE: {
      const start = edges.kind[i] === ARC ? k + 3 : k + 6
      s[start] += s[start + 1]
      s[start + 1] = -s[start + 1]
      break
    }
    case BEZIER:
      for (let a = 0, b = s[k]; a < b; a++, b--) for (let m = 2; m < 5; m++) swap(s, k + m + 3 * a, k + m + 3 * b)
      break
  }
}
