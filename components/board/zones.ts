import { type Box, type DrawingPoint, toScreen, type View, type Viewport } from './view'

/** The drawn sheet with its zones as ISO 5457 has them: letters from the top, figures from the left. */
export interface Sheet {
  box: Box
  columns: number
  rows: number
}

/** Letters of ISO 5457: I and O are left out. */
const LETTERS = 'ABCDEFGHJKLMNPQRSTUVWXYZ'

/** The sheet around what is drawn: a margin of an eighth, four zones along its longer side. */
export function sheetAround(extents: Box): Sheet {
  const width = extents.maxX - extents.minX
  const height = extents.maxY - extents.minY
  const longer = Math.max(width, height, 1e-9)
  const margin = longer / 8
  const zone = (longer + 2 * margin) / 4
  const columns = Math.max(2, Math.round((width + 2 * margin) / zone))
  const rows = Math.max(2, Math.round((height + 2 * margin) / zone))
  const growX = Math.max(margin, (columns * zone - width) / 2)
  const growY = Math.max(margin, (rows * zone - height) / 2)
  return {
    box: { minX: extents.minX - growX, minY: extents.minY - growY, maxX: extents.maxX + growX, maxY: extents.maxY + growY },
    columns,
    rows,
  }
}

const indexOf = (at: number, from: number, to: number, count: number) =>
  Math.min(Math.max(Math.floor((count * (at - from)) / (to - from)), 0), count - 1)

/** The zone that holds a point, as "B2"; points beyond the sheet belong to the nearest zone. */
export function zoneOf(sheet: Sheet, at: DrawingPoint): string {
  const { box, columns, rows } = sheet
  const row = indexOf(-at.y, -box.maxY, -box.minY, rows)
  return `${LETTERS[row]}${indexOf(at.x, box.minX, box.maxX, columns) + 1}`
}

export interface ZoneMark {
  text: string
  /** px along the edge; null where the zone is out of view */
  at: number | null
  /** px along the edge where the zone ends; null after the last zone or out of view */
  end: number | null
}

/** How much of an edge a zone must hold for its name to be written there, px. */
const ROOM = 18

function marksAlong(starts: number[], length: number, name: (k: number) => string): ZoneMark[] {
  return starts.slice(0, -1).map((start, k) => {
    const from = Math.max(start, 0)
    const to = Math.min(starts[k + 1], length)
    const last = k === starts.length - 2
    const border = starts[k + 1]
    return {
      text: name(k),
      at: to - from < ROOM ? null : (from + to) / 2,
      end: last || border < 0 || border > length ? null : border,
    }
  })
}

/** Where names and borders of the zones stand along the edges of the board: they move with the sheet. */
export function zoneMarks(sheet: Sheet, view: View, viewport: Viewport): { columns: ZoneMark[]; rows: ZoneMark[] } {
  const { box, columns, rows } = sheet
  const split = (n: number, from: number, to: number) => Array.from({ length: n + 1 }, (_, k) => from + (k * (to - from)) / n)
  const xs = split(columns, box.minX, box.maxX).map((x) => toScreen(view, { x, y: 0 }).x)
  const ys = split(rows, box.maxY, box.minY).map((y) => toScreen(view, { x: 0, y }).y)
  return {
    columns: marksAlong(xs, viewport.width, (k) => String(k + 1)),
    rows: marksAlong(ys, viewport.height, (k) => LETTERS[k]),
  }
}
