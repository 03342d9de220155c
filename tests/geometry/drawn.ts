import { type EdgeTable, emptyTable, pushArc, pushLine } from '@/lib/geometry/edges'
import { outlinesOf } from '@/lib/geometry/outlines'
import type { OutlineSet, Tolerances } from '@/lib/geometry/outlineSet'
import type { ArcRun } from '@/lib/geometry/recipe'

export const TOLERANCES: Tolerances = { lastDigit: 0.0005, chaining: 0.01, duplicate: 0.01, snap: 1e-7 }

/** A small drawing by hand: every line or arc an entity of its own, every polyline one entity. */
export class Drawn {
  edges: EdgeTable = emptyTable()
  private source = 0
  line(x0: number, y0: number, x1: number, y1: number): this {
    pushLine(this.edges, x0, y0, x1, y1, this.source++)
    return this
  }
  /** angles in degrees, counter-clockwise from `from` to `to` */
  arc(cx: number, cy: number, r: number, from: number, to: number): this {
    const a = (from * Math.PI) / 180
    const b = (to * Math.PI) / 180
    const point = (t: number) => [cx + r * Math.cos(t), cy + r * Math.sin(t)] as const
    pushArc(this.edges, ...point(a), ...point(b), cx, cy, r, a, b - a, this.source++)
    return this
  }
  circle(cx: number, cy: number, r: number): this {
    pushArc(this.edges, cx + r, cy, cx + r, cy, cx, cy, r, 0, 2 * Math.PI, this.source++)
    return this
  }
  polyline(points: [number, number][], closed = true): this {
    for (let i = 0; i < points.length - (closed ? 0 : 1); i++)
      pushLine(this.edges, ...points[i], ...points[(i + 1) % points.length], this.source)
    this.source++
    return this
  }
  /** a closed polyline */
  rectangle(x0: number, y0: number, x1: number, y1: number): this {
    return this.polyline([
      [x0, y0],
      [x1, y0],
      [x1, y1],
      [x0, y1],
    ])
  }
  /** four loose lines */
  lines(x0: number, y0: number, x1: number, y1: number): this {
    return this.line(x0, y0, x1, y0).line(x1, y0, x1, y1).line(x1, y1, x0, y1).line(x0, y1, x0, y0)
  }
  outlines(tolerances: Partial<Tolerances> = {}, arcs: ArcRun[] = []): OutlineSet {
    const take = new Uint32Array(this.edges.count).map((_, i) => i)
    return outlinesOf(this.edges, take, { ...TOLERANCES, ...tolerances }, { arcs, mmPerUnit: 1 })
  }
}

export const codesOf = (set: OutlineSet): string[] => set.findings.map((finding) => finding.code)
