import { pushBulge } from '../bulge'
import type { Reading } from '../reading'

/** The vertices of the polyline at hand: x, y and bulge of each, in the entity's own plane. Reused. */
export class Vertices {
  count = 0
  xyb = new Float64Array(3 * 64)

  /** Row i, making room for it. */
  reach(i: number): void {
    if (3 * i + 3 > this.xyb.length) {
      const wider = new Float64Array(2 * this.xyb.length)
      wider.set(this.xyb)
      this.xyb = wider
    }
  }

  /** Appends edges between the vertices to the reading's sheet; edges without length are passed over. Answers how many. */
  push(reading: Reading, row: number, closed: boolean, facing: number): number {
    const { xyb, count } = this
    const { edges } = reading.sheet
    let pushed = 0
    for (let i = 1; i < count + (closed ? 1 : 0); i++) {
      const j = 3 * (i - 1)
      const k = i < count ? 3 * i : 0
      const x0 = facing * xyb[j] + 0
      const x1 = facing * xyb[k] + 0
      if (pushBulge(edges, x0, xyb[j + 1], x1, xyb[k + 1], facing * xyb[j + 2], row)) pushed++
    }
    return pushed
  }
}
