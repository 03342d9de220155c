import { type EdgeTable, LINE } from '../geometry/edges'
import { addSegment, loadCurve, newCurve } from './curve'
import type { Frame } from './frame'
import { lineMoments } from './momentArray'

const curve = newCurve()

/**
 * Moments of what edge i bounds with the frame's origin, into `out` (six numbers): its chord from snapped end to snapped end,
 * and the segment between chord and carrier. So loops close to the last bit wherever ends were snapped.
 */
export function edgeMoments(edges: EdgeTable, i: number, frame: Frame, out: Float64Array): void {
  const { cos, sin } = frame
  const e = edges.ends
  const x = e[4 * i] - frame.x
  const y = e[4 * i + 1] - frame.y
  const dx = e[4 * i + 2] - e[4 * i]
  const dy = e[4 * i + 3] - e[4 * i + 1]
  lineMoments(x * cos + y * sin, y * cos - x * sin, dx * cos + dy * sin, dy * cos - dx * sin, out)
  if (edges.kind[i] === LINE) return
  loadCurve(edges, i, frame, curve)
  addSegment(curve, curve.from, curve.to, curve.ku, curve.kv, out)
}
