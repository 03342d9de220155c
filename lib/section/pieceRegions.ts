import { emptyTable, pushCopy } from '../geometry/edges'
import type { Region } from '../geometry/region'

/** Each piece of the metal as a region of its own. */
export function pieceRegions(region: Region): Region[] {
  const { edges, loopStart, hole, piece, pieces } = region
  if (pieces === 1) return [region]
  return Array.from({ length: pieces }, (_, wanted) => {
    const own = emptyTable()
    const starts = [0]
    const holes: number[] = []
    piece.forEach((of, loop) => {
      if (of !== wanted) return
      for (let i = loopStart[loop]; i < loopStart[loop + 1]; i++) pushCopy(own, edges, i)
      starts.push(own.count)
      holes.push(hole[loop])
    })
    return {
      edges: own,
      loopStart: Uint32Array.from(starts),
      hole: Uint8Array.from(holes),
      piece: new Uint32Array(holes.length),
      pieces: 1,
    }
  })
}
