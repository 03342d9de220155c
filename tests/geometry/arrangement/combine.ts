import { type Arrangement, arrange } from '@/lib/geometry/arrangement/arrange'
import { joinLoops, type Loops, noLoops } from '@/lib/geometry/arrangement/loops'
import { type Shape, sizeOf, tableOf } from './shapes'

/** The arrangement of shapes at the engine's own snap, 1e-9 of their size. */
export function arrangementOf(shapes: Shape[], relative = 1e-9): Arrangement {
  const { edges, owner } = tableOf(shapes)
  const a = arrange(edges, owner, shapes.length, relative * sizeOf(shapes))
  if (!a) throw new Error('too many meetings')
  return a
}

/** The region where the rule holds, with the vertices at which its boundary did not close. */
export function where(
  a: Arrangement,
  rule: (held: boolean[]) => boolean,
  owners = 2,
): { loops: Loops; area: number; faults: number } {
  const inside = a.sets.map((set) => rule(Array.from({ length: owners }, (_, k) => set.includes(k))))
  const loops = noLoops()
  const faults = joinLoops(a, (u) => Number(inside[a.left[u]]) - Number(inside[a.right[u]]), loops)
  return { loops, area: loops.area.reduce((sum, v) => sum + v, 0), faults: faults.length }
}
