import type { Repair } from '../geometry/region'
import type { Boundary } from './boundary'

/**
 * First-order bounds of what one cause can change in the basic integrals about the centroid, all ≥ 0 but the tensor's xy:
 * area mm², first moments x, y mm³ (∫x dA, ∫y dA), second-moment tensor xx, yy, xy mm⁴, boundary length and point mm.
 * `relative` is added as a part of each figure's own scale.
 */
export interface Change {
  area: number
  x: number
  y: number
  xx: number
  yy: number
  xy: number
  length: number
  point: number
  relative: number
}

/** The boundary moves out or in by at most δ: |ΔA| ≤ δ∮ds, |ΔIx| ≤ δ∮y² ds …; ∮|y| ds ≤ √(∮ds·∮y² ds). */
export function changeByDisplacement(boundary: Boundary, delta: number, relative = 0): Change {
  const length = boundary.outer + boundary.inner
  return {
    area: delta * length,
    x: delta * Math.sqrt(length * boundary.xx),
    y: delta * Math.sqrt(length * boundary.yy),
    xx: delta * boundary.xx,
    yy: delta * boundary.yy,
    xy: delta * boundary.xy,
    length: delta * boundary.turning,
    point: delta,
    relative,
  }
}

/** Each repair decided a small area at one place; about the centroid (x, y). */
export function changeByRepairs(repairs: readonly Repair[], x: number, y: number): Change {
  const change: Change = { area: 0, x: 0, y: 0, xx: 0, yy: 0, xy: 0, length: 0, point: 0, relative: 0 }
  for (const repair of repairs) {
    const area = Math.abs(repair.area)
    const dx = repair.x - x
    const dy = repair.y - y
    change.area += area
    change.x += area * Math.abs(dx)
    change.y += area * Math.abs(dy)
    change.xx += area * dx * dx
    change.yy += area * dy * dy
    change.xy += area * dx * dy
    change.length += repair.gap
    change.point = Math.max(change.point, repair.gap)
  }
  return change
}

/** Part of the tensor about an axis turned by `degrees` from x: bounds the change of the second moment about it. */
export function aboutTurned({ xx, yy, xy }: Change, degrees: number): number {
  const c = Math.cos((degrees * Math.PI) / 180)
  const s = Math.sin((degrees * Math.PI) / 180)
  return Math.max(0, yy * c * c + xx * s * s - 2 * xy * s * c)
}
