import { LWPOLYLINE_KIND } from '../kinds'
import type { Reading } from '../reading'

/**
 * LWPOLYLINE: vertices (10, 20) with bulges (42) in the entity's own plane. The i-th x goes with the i-th y
 * whatever the order of the groups; a bulge belongs to the vertex begun last. A count (90) that is not the
 * number of vertices is a fault: vertices may have been lost.
 */
export function readLwPolyline(reading: Reading) {
  if (reading.facing === 0) return reading.refuseTilted(LWPOLYLINE_KIND)
  const { record, facing, vertices } = reading
  let xs = 0
  let ys = 0
  let bulges = 0
  let says = -1
  let closed = false
  let width = 0
  let z = 0
  for (let g = 0; g < record.count; g++) {
    const code = record.code[g]
    if (code !== 10 && code !== 20 && code !== 42 && code !== 70 && code !== 90 && code !== 38 && !(code >= 40 && code <= 43))
      continue
    const value = record.finite(g)
    if (Number.isNaN(value)) return reading.refuseRecord(LWPOLYLINE_KIND)
    switch (code) {
      case 10:
        vertices.reach(xs)
        vertices.xyb[3 * xs] = value
        if (xs >= ys) vertices.xyb[3 * xs + 2] = 0
        xs++
        break
      case 20:
        vertices.reach(ys)
        vertices.xyb[3 * ys + 1] = value
        if (ys >= xs) vertices.xyb[3 * ys + 2] = 0
        ys++
        break
      case 42: {
        const vertex = Math.max(xs, ys) - 1
        if (vertex < 0) return reading.refuse(LWPOLYLINE_KIND, 'bulge-without-vertex')
        vertices.xyb[3 * vertex + 2] = value
        bulges++
        break
      }
      case 70:
        closed = (value & 1) === 1
        break
      case 90:
        says = value
        break
      case 38:
        z = value
        break
      default:
        width = Math.max(width, Math.abs(value))
    }
  }
  if (xs !== ys) return reading.refuse(LWPOLYLINE_KIND, 'vertex-incomplete', { xs, ys, what: xs > ys ? 'y' : 'x' })
  if (bulges > xs) return reading.refuse(LWPOLYLINE_KIND, 'vertex-incomplete', { xs, ys, what: 'single bulge' })
  if (says >= 0 && says !== xs) return reading.refuse(LWPOLYLINE_KIND, 'vertex-count', { says, has: xs })
  vertices.count = xs
  const row = reading.begin(LWPOLYLINE_KIND)
  if (xs < 2) return reading.remark(row, 'polyline-without-vertices', { ...reading.where(LWPOLYLINE_KIND), vertices: xs })
  reading.height(facing * z)
  const at: [number, number] = [facing * vertices.xyb[0], vertices.xyb[1]]
  if (width > 0) reading.remark(row, 'polyline-width', { ...reading.where(LWPOLYLINE_KIND), width }, at)
  if (closed) reading.sheet.entities.closed[row] = 1
  if (vertices.push(reading, row, closed, facing) === 0) reading.remark(row, 'no-length', reading.where(LWPOLYLINE_KIND), at)
}
