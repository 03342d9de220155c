import { emptyTable, pushCopy, pushLine } from '../edges'
import { outlinesOf } from '../outlines'
import type { Tolerances } from '../outlineSet'
import type { MakeUpStep, XY } from '../recipe'
import type { Region } from '../region'
import { regionOf } from './regionOf'

/** The region with polygons added or cut; null where they cannot be combined. */
export function patched(region: Region, patches: XY[][], does: 'add' | 'cut', tolerances: Tolerances): Region | null {
  const { edges, loopStart, hole } = region
  const loops = hole.length
  const table = emptyTable(edges.count, edges.shapesUsed)
  for (let k = 0; k < loops; k++) {
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) table.source[pushCopy(table, edges, i)] = k
  }
  for (const [n, patch] of patches.entries()) {
    for (const [i, from] of patch.entries()) pushLine(table, ...from, ...patch[(i + 1) % patch.length], loops + n)
  }
  const take = Uint32Array.from({ length: table.count }, (_, i) => i)
  const set = outlinesOf(table, take, tolerances, { arcs: [], mmPerUnit: 1 })
  if (set.count !== loops + patches.length) return null
  // the larger first: what lies in a hole comes after it
  const order = Array.from({ length: set.count }, (_, k) => k).sort((a, b) => set.area[b] - set.area[a])
  const isPatch = (k: number) => set.source[k] >= loops
  const step = (k: number): MakeUpStep => ({
    at: [set.at[2 * k], set.at[2 * k + 1]],
    does: isPatch(k) ? does : hole[set.source[k]] ? 'cut' : 'add',
  })
  const makeUp = [...order.filter((k) => !isPatch(k)), ...order.filter(isPatch)].map(step)
  return regionOf(set, { makeUp, part: null, bonds: [] }, tolerances).region
}
