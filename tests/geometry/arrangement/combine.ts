import { type Arrangement, arrange } from '@/lib/geometry/arrangement/arrange'
import { joinLoops, type Loops, noLoops } from '@/lib/geometry/arrangement/loops'
import { type Shape, sizeOf, tableOf } from './shapes'

/** The arrangement of shapes at the engine's own snap, 1e-9 of their size. */
export function arrangementOf(shapes: Shape[], relative = 1e-9, size: Shape[] = shapes): Arrangement {
  const { edges, owner } = tableOf(shapes)
  const a = arrange(edges, owner, shapes.length, relative * sizeOf(size))
  if (!a) throw new Error('too many meetings')
  return a
}

/** Loops, net area, and how many vertices at which the boundary did not close. */
export interface Combined {
  loops: Loops
  area: number
  faults: number
}

/** The region where the rule holds. */
export function where(a: Arrangement, rule: (held: boolean[]) => boolean, owners = 2): Combined {
  const inside = a.sets.map((set) => rule(Array.from({ length: owners }, (_, k) => set.includes(k))))
  const loops = noLoops()
  const faults = joinLoops(a, (u) => Number(inside[a.left[u]]) - Number(inside[a.right[u]]), loops)
  return { loops, area: loops.area.reduce((sum, v) => sum + v, 0), faults: faults.length }
}
