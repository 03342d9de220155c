import { groupOutlines } from '@/lib/geometry/groups'
import { mmPerUnit, type XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'

/** A detail of the sheet: outlines that lie apart from all others. */
export interface Detail {
  number: number
  /** indices of its outlines */
  members: number[]
  /** mm, as drawn on the sheet */
  width: number
  height: number
  /** its middle and its size, drawing units */
  at: XY
  size: number
  /** a point on each of its outlines, as a recipe's part names it */
  part: XY[]
  taken: boolean
}

const pointOf = ({ outlines }: PreviewResult, k: number): XY => [outlines.at[2 * k], outlines.at[2 * k + 1]]

/** The outlines that are the sheet, not its details: found by the reader, or said by a person (`frames`). */
function sheetParts({ outlines }: PreviewResult, frames: readonly XY[]): Set<number> {
  const parts = new Set([...outlines.frames, ...outlines.titleBlocks.flat()])
  for (const [x, y] of frames) {
    for (let k = 0; k < outlines.count; k++) if (outlines.at[2 * k] === x && outlines.at[2 * k + 1] === y) parts.add(k)
  }
  return parts
}

/** The details of a sheet, largest first; frames and title blocks are none. */
export function detailsOf(result: PreviewResult, frames: readonly XY[] = []): Detail[] {
  const { outlines, answer } = result
  const mm = mmPerUnit(answer.recipe)
  const aside = sheetParts(result, frames)
  const alone = Uint8Array.from({ length: outlines.count }, (_, k) => Number(aside.has(k)))
  const { group, groups } = groupOutlines(outlines, alone)
  const members = new Map<number, number[]>()
  for (let k = 0; k < outlines.count; k++) {
    if (!aside.has(k)) members.set(group[k], [...(members.get(group[k]) ?? []), k])
  }
  const chosen = new Set((answer.recipe.part ?? []).map(([x, y]) => `${x} ${y}`))
  const details = [...members].map(([number, own]): Detail => {
    const { minX, minY, maxX, maxY } = groups[number]
    const part = own.map((k) => pointOf(result, k))
    return {
      number,
      members: own,
      width: mm * (maxX - minX),
      height: mm * (maxY - minY),
      at: [(minX + maxX) / 2, (minY + maxY) / 2],
      size: Math.max(maxX - minX, maxY - minY),
      part,
      taken: part.some(([x, y]) => chosen.has(`${x} ${y}`)),
    }
  })
  return details.sort((a, b) => b.size - a.size)
}

/** The one outline round all others, where what it holds falls apart into details without it: a frame? */
export function likelyFrame(result: PreviewResult): { at: XY; part: XY[] } | null {
  const { outlines, answer } = result
  if (answer.recipe.part || outlines.count < 3) return null
  const outer = [...outlines.depth.subarray(0, outlines.count)].flatMap((depth, k) => (depth === 0 ? [k] : []))
  if (outer.length !== 1) return null
  const at = pointOf(result, outer[0])
  const details = detailsOf(result, [at])
  return details.length > 1 ? { at, part: details.flatMap(({ part }) => part) } : null
}

/** The detail that an outline belongs to. */
export const detailAt = (details: readonly Detail[], outline: number) => details.find(({ members }) => members.includes(outline))

/** A block of the drawing that holds outlines. */
export interface PlacedBlock {
  name: string
  /** how often it is placed */
  times: number
  /** a point on each outline of its first placement, as a recipe's part names it */
  part: XY[]
  area: number
}

/** The blocks that brought outlines in, largest first; frames and title blocks are none of the profile. */
export function blocksOf(result: PreviewResult, frames: readonly XY[] = []): PlacedBlock[] {
  const { outlines, placed, drawing } = result
  const aside = sheetParts(result, frames)
  const found = new Map<number, { first: number; inserts: Set<number>; members: number[] }>()
  for (let k = 0; k < outlines.count; k++) {
    const block = placed.block[k]
    if (block === 0 || aside.has(k)) continue
    const entry = found.get(block) ?? { first: placed.insert[k], inserts: new Set(), members: [] }
    found.set(block, entry)
    entry.inserts.add(placed.insert[k])
    if (placed.insert[k] === entry.first) entry.members.push(k)
  }
  return [...found]
    .map(([block, { inserts, members }]) => ({
      name: drawing.blocks[block - 1],
      times: inserts.size,
      part: members.map((k) => pointOf(result, k)),
      area: Math.max(...members.map((k) => outlines.area[k])),
    }))
    .sort((a, b) => b.area - a.area)
}

/** Points that name these outlines, by the board's ids (o1 is the first), in a recipe's part. */
export const partOf = (result: PreviewResult, ids: readonly string[]): XY[] =>
  ids.map((id) => pointOf(result, Number(id.slice(1)) - 1))
