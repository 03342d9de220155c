import { type EdgeTable, emptyTable, pushCopy } from './edges'

/** The loops for which `keep` is true, in their order, in a table of their own. */
export function selectLoops(
  edges: EdgeTable,
  loopStart: Uint32Array,
  keep: (loop: number) => boolean,
): { edges: EdgeTable; loopStart: Uint32Array } {
  const kept = emptyTable(edges.count, edges.shapesUsed)
  const start = [0]
  for (let k = 0; k + 1 < loopStart.length; k++) {
    if (!keep(k)) continue
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) pushCopy(kept, edges, i)
    start.push(kept.count)
  }
  return { edges: kept, loopStart: Uint32Array.from(start) }
}
