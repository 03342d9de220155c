import { ARC, BEZIER, type EdgeTable, ELLIPSE } from '../geometry/edges'
import type { OutlineSet } from '../geometry/outlineSet'

/** What the engine combined and what it found, in drawing units: the question put to another library. */
export interface Combination {
  outlines: OutlineSet
  /** in order; outlines that are left out do not appear */
  steps: { outline: number; does: 'add' | 'cut' | 'common' }[]
  /** net area that the engine found */
  area: number
}

export interface Frame {
  x: number
  y: number
  size: number
}

/** Middle and greatest extent of the outlines that take part. */
export function frameOf({ outlines, steps }: Combination): Frame {
  const box = [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY]
  for (const { outline } of steps) {
    for (const k of [0, 1]) {
      box[k] = Math.min(box[k], outlines.bounds[4 * outline + k])
      box[k + 2] = Math.max(box[k + 2], outlines.bounds[4 * outline + k + 2])
    }
  }
  return { x: (box[0] + box[2]) / 2, y: (box[1] + box[3]) / 2, size: Math.max(box[2] - box[0], box[3] - box[1]) }
}

/** An upper bound of the length of edge i: exact for lines and circular arcs. */
export function lengthBound({ kind, ends, shape, shapes }: EdgeTable, i: number): number {
  const k = shape[i]
  switch (kind[i]) {
    case ARC:
      return shapes[k + 2] * Math.abs(shapes[k + 4])
    case ELLIPSE:
      return Math.hypot(shapes[k + 2], shapes[k + 3], shapes[k + 4], shapes[k + 5]) * Math.abs(shapes[k + 7])
    case BEZIER: {
      let length = 0
      for (let j = 0; j < shapes[k]; j++) {
        const p = k + 2 + 3 * j
        length += Math.hypot(shapes[p + 3] - shapes[p], shapes[p + 4] - shapes[p + 1])
      }
      return length
    }
    default:
      return Math.hypot(ends[4 * i + 2] - ends[4 * i], ends[4 * i + 3] - ends[4 * i + 1])
  }
}

/** Sum of the lengths of all edges that take part, curves or all. */
export function lengthOf({ outlines, steps }: Combination, curvesOnly = false): number {
  let sum = 0
  for (const { outline } of steps) {
    for (let i = outlines.loopStart[outline]; i < outlines.loopStart[outline + 1]; i++) {
      if (!curvesOnly || outlines.edges.kind[i] !== 0) sum += lengthBound(outlines.edges, i)
    }
  }
  return sum
}

export const edgesIn = ({ outlines, steps }: Combination): number =>
  steps.reduce((sum, { outline }) => sum + outlines.loopStart[outline + 1] - outlines.loopStart[outline], 0)

/** Text of a number for a sentence. */
export const digits = (value: number): string => String(Number(value.toPrecision(10)))
