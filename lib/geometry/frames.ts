import { unionOfBoxes } from './bounds'
import { ARC, LINE } from './edges'
import type { Loops } from './nest'
import type { OutlineSet } from './outlineSet'

/** Outlines that look like part of a sheet, not of a profile. */
export interface SheetParts {
  /** rectangles round everything that touch nothing */
  frames: number[]
  /** tables of rectangles that touch one another: title blocks, parts lists */
  titleBlocks: number[][]
}

/** Of four lines along x and y. */
function isRectangle({ edges, loopStart, bounds }: Loops, k: number): boolean {
  const from = loopStart[k]
  const to = loopStart[k + 1]
  if (to - from < 4) return false
  const e = edges.ends
  for (let i = from; i < to; i++) {
    if (edges.kind[i] !== LINE) return false
    const alongX = e[4 * i + 1] === e[4 * i + 3] && (e[4 * i + 1] === bounds[4 * k + 1] || e[4 * i + 1] === bounds[4 * k + 3])
    const alongY = e[4 * i] === e[4 * i + 2] && (e[4 * i] === bounds[4 * k] || e[4 * i] === bounds[4 * k + 2])
    if (!alongX && !alongY) return false
  }
  return true
}

/** sides of the sheets of ISO 216, mm */
const SHEETS = [210, 297, 420, 594, 841, 1189]
const MARGINS = 40
const FEWEST_CELLS = 4

/** Rectangles of a cluster that fill their common box like the cells of a table; null where they do not. */
function tableOf(loops: Loops, cluster: number[]): number[] | null {
  const { bounds, area } = loops
  const common = unionOfBoxes(
    Float64Array.from(cluster.flatMap((k) => [...bounds.subarray(4 * k, 4 * k + 4)])),
    0,
    cluster.length,
  )
  const whole = (common[2] - common[0]) * (common[3] - common[1])
  const cells = cluster.filter((k) => area[k] < 0.98 * whole)
  const filled = cells.reduce((sum, k) => sum + area[k], 0)
  return cells.length >= FEWEST_CELLS && (filled >= 0.98 * whole || cells.length < cluster.length) ? cells : null
}

/**
 * Looks for drawing frames and title blocks. A frame is a rectangle outside all others that touches nothing but title
 * blocks and holds every other outline, not as a tube its chamber, and holds a title block or outlines that hold others, or
 * has the size of a drawing sheet or more than metal that solid ever has. A title block is at least four rectangles that
 * touch one another and fill a box like cells, or the `undecided` faces between a frame and lines that end on it.
 * Common practice, no source: they are only offered, never decided.
 */
export function sheetParts(
  loops: Loops,
  { depth, clusters, undecided }: Pick<OutlineSet, 'depth' | 'clusters' | 'undecided'>,
  mmPerUnit: number,
): SheetParts {
  const { count } = loops
  const touches = new Uint8Array(count)
  const apart = new Uint8Array(count)
  const titleBlocks: number[][] = []
  const facesIn = new Map<number, number[]>()
  for (const cluster of clusters) {
    const [ring, ...others] = cluster.filter((k) => !undecided[k])
    if (ring !== undefined && others.length === 0 && cluster.length > 1 && isRectangle(loops, ring)) {
      const faces = cluster.filter((k) => k !== ring)
      facesIn.set(ring, faces)
      for (const k of faces) apart[k] = 1
      continue
    }
    const cells = cluster.length >= FEWEST_CELLS && cluster.every((k) => isRectangle(loops, k)) ? tableOf(loops, cluster) : null
    if (cells) titleBlocks.push(cells)
    for (const k of cells ?? cluster) (cells ? apart : touches)[k] = 1
  }
  const rings: number[] = []
  for (let level = 0; level < 3; level++) {
    const k = soleAt(depth, level, apart)
    if (k < 0 || touches[k] || !isRectangle(loops, k)) break
    rings.push(k)
  }
  const isLastFrame = () => {
    const ring = rings[rings.length - 1]
    return isFrame(loops, depth, ring, rings.length - 1, apart, titleBlocks.length > 0 || facesIn.has(ring), mmPerUnit)
  }
  while (rings.length > 0 && !isLastFrame()) rings.pop()
  for (const ring of rings) titleBlocks.push(...[facesIn.get(ring)].flatMap((faces) => (faces ? [faces] : [])))
  return { frames: rings, titleBlocks }
}

/** The only outline of a depth, all others lying deeper; −1 where there is none. */
function soleAt(depth: Int32Array, level: number, apart: Uint8Array): number {
  let sole = -1
  for (let k = 0; k < depth.length; k++) {
    if (apart[k]) continue
    if (depth[k] < 0 || (depth[k] === level && sole >= 0)) return -1
    if (depth[k] === level) sole = k
  }
  return sole
}

function isFrame(
  loops: Loops,
  depth: Int32Array,
  outer: number,
  level: number,
  apart: Uint8Array,
  titled: boolean,
  mmPerUnit: number,
): boolean {
  const { count, bounds, area } = loops
  const inside: number[] = []
  let deepest = level
  for (let k = 0; k < count; k++) {
    if (apart[k]) continue
    if (depth[k] === level + 1) inside.push(k)
    deepest = Math.max(deepest, depth[k])
  }
  const filled = inside.reduce((sum, k) => sum + area[k], 0) / area[outer]
  if (deepest === level || (!titled && isTube(loops, outer, inside))) return false
  const width = (bounds[4 * outer + 2] - bounds[4 * outer]) * mmPerUnit
  const height = (bounds[4 * outer + 3] - bounds[4 * outer + 1]) * mmPerUnit
  const [long, short] = [Math.max(width, height), Math.min(width, height)]
  if (titled || isSheet(long, short)) return filled <= FULLEST_SHEET
  const isLarge = short >= LARGEST_SOLID && inside.some((k) => !isRound(loops, k))
  return (deepest >= level + 2 || isLarge) && filled <= FULLEST
}

/** A profile may fill a sheet; the chambers of a hollow section fill it more. */
const FULLEST_SHEET = 0.8
const FULLEST = 0.5
/** Mostly solid metal this wide (mm) and with openings other than round is rather a sheet with a detail. */
const LARGEST_SOLID = 150

/** Whether one rectangle alone lies inside with the same wall on opposite sides. */
function isTube(loops: Loops, outer: number, inside: number[]): boolean {
  if (inside.length > 1 || !isRectangle(loops, inside[0])) return false
  const [a, b] = [outer, inside[0]].map((k) => loops.bounds.subarray(4 * k, 4 * k + 4))
  const size = Math.max(a[2] - a[0], a[3] - a[1])
  const isEven = (low: number, high: number) => Math.abs(b[low] - a[low] - (a[high] - b[high])) <= 1e-6 * size
  return isEven(0, 2) && isEven(1, 3)
}

const isRound = ({ edges, loopStart }: Loops, k: number): boolean => {
  for (let i = loopStart[k]; i < loopStart[k + 1]; i++) if (edges.kind[i] !== ARC) return false
  return true
}

/** A sheet of ISO 216 A4 to A0 less a margin of up to 20 mm a side. */
function isSheet(long: number, short: number): boolean {
  return SHEETS.some(
    (side, n) => n > 0 && long <= side && long >= side - MARGINS && short <= SHEETS[n - 1] && short >= SHEETS[n - 1] - MARGINS,
  )
}
