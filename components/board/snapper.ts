import { ARC } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'
import { type Snap, snapperOf as engineSnapper } from '@/lib/geometry/snap'
import type { DrawingPoint } from './view'

export interface Snapped {
  at: DrawingPoint
  /** null where nothing is near: the bare point */
  kind: Snap['kind'] | null
  /** radius of the arc it belongs to, mm */
  radius: number | null
}

export type Snapper = (p: DrawingPoint, reach: number) => Snapped

/** Snaps to ends, centres, middles and edges of the metal within `reach` mm, else stays where it is. */
export function snapperOf(region: Region | null): Snapper {
  const bare = (at: DrawingPoint): Snapped => ({ at, kind: null, radius: null })
  if (!region) return bare
  const { edges } = region
  const find = engineSnapper(edges)
  return (p, reach) => {
    const found = find(p.x, p.y, reach)
    if (!found) return bare(p)
    const round = edges.kind[found.edge] === ARC && found.kind !== 'end'
    return {
      at: { x: found.x, y: found.y },
      kind: found.kind,
      radius: round ? edges.shapes[edges.shape[found.edge] + 2] : null,
    }
  }
}
