import { emptyTable, edgeAt, pushCopy, pushEdge, reversed } from '../geometry/edges'
import type { OutlineSet, Tolerances } from '../geometry/outlineSet'
import type { Recipe } from '../geometry/recipe'
import type { Combined } from './steps'

export function nestedRegion(outlines: OutlineSet, _t: Tolerances, _r: Recipe): Combined {
  const { edges, loopStart, count, depth, area } = outlines
  const table = emptyTable(edges.count, edges.shapesUsed)
  const starts = [0]
  const hole = new Uint8Array(count)
  let net = 0
  for (let k = 0; k < count; k++) {
    hole[k] = depth[k] % 2
    net += hole[k] ? -area[k] : area[k]
    if (hole[k]) for (let i = loopStart[k + 1] - 1; i >= loopStart[k]; i--) pushEdge(table, reversed(edgeAt(edges, i)))
    else for (let i = loopStart[k]; i < loopStart[k + 1]; i++) pushCopy(table, edges, i)
    starts.push(table.count)
  }
  const steps = Array.from({ length: count }, (_, outline) => ({
    outline,
    does: depth[outline] % 2 ? ('cut' as const) : ('add' as const),
  }))
  steps.sort((a, b) => depth[a.outline] - depth[b.outline])
  return {
    metal: { edges: table, loopStart: Uint32Array.from(starts), hole, piece: new Uint32Array(count), pieces: 1 },
    roles: Array.from(hole, (h) => (h ? 'cut' : 'add')),
    combination: { outlines, steps, area: net },
    findings: [],
  }
}
