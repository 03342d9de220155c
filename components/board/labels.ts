import type { Box, ScreenPoint, Viewport } from './view'

/** A line on the board that no label may lie on, px. */
export interface Segment {
  a: ScreenPoint
  b: ScreenPoint
}

/** A label and the places it may take, best first; each place is the middle of its box. */
export interface Label {
  id: string
  width: number
  height: number
  places: ScreenPoint[]
}

/** Room kept between a label and the lines around it, px. */
const CLEAR = 4

export function boxAt(label: Pick<Label, 'width' | 'height'>, at: ScreenPoint): Box {
  const w = label.width / 2 + CLEAR
  const h = label.height / 2 + CLEAR
  return { minX: at.x - w, minY: at.y - h, maxX: at.x + w, maxY: at.y + h }
}

/** Does the segment touch the box? (Liang and Barsky's clipping.) */
export function crossesBox({ a, b }: Segment, box: Box): boolean {
  let from = 0
  let to = 1
  const dx = b.x - a.x
  const dy = b.y - a.y
  const edges: [number, number][] = [
    [-dx, a.x - box.minX],
    [dx, box.maxX - a.x],
    [-dy, a.y - box.minY],
    [dy, box.maxY - a.y],
  ]
  for (const [p, q] of edges) {
    if (p === 0) {
      if (q < 0) return false
    } else if (p < 0) {
      from = Math.max(from, q / p)
    } else {
      to = Math.min(to, q / p)
    }
  }
  return from <= to
}

const overlap = (a: Box, b: Box) => a.minX < b.maxX && b.minX < a.maxX && a.minY < b.maxY && b.minY < a.maxY
/** Along the top and the left stand the names of the zones, px. */
const ZONES = 20
const inside = (box: Box, viewport: Viewport) =>
  box.minX >= ZONES && box.minY >= ZONES && box.maxX <= viewport.width && box.maxY <= viewport.height

/**
 * The place each label takes: the first of its places inside the board that no line crosses and no
 * earlier label (or `held` box) holds; where there is none, the one with the fewest lines. Answers an index per label id.
 */
export function placeLabels(labels: Label[], lines: Segment[], viewport: Viewport, held: Box[] = []): Record<string, number> {
  const taken = [...held]
  const chosen: Record<string, number> = {}
  for (const label of labels) {
    let best = 0
    let least = Number.POSITIVE_INFINITY
    for (let k = 0; k < label.places.length && least > 0; k++) {
      const box = boxAt(label, label.places[k])
      let faults = inside(box, viewport) ? 0 : 100
      faults += 10 * taken.filter((other) => overlap(box, other)).length
      for (const line of lines) if (crossesBox(line, box)) faults++
      if (faults < least) {
        least = faults
        best = k
      }
    }
    chosen[label.id] = best
    if (label.places.length > 0) taken.push(boxAt(label, label.places[best]))
  }
  return chosen
}

/** About how wide a text is, px: the interface's face is 0.56 em a character on average, the figures' 0.61. */
export const textWidth = (text: string, size: number, mono = false) => text.length * size * (mono ? 0.61 : 0.56)
