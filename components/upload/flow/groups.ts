import { mmPerUnit, type XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'

/** A detail of the sheet: outlines that lie apart from all others. */
export interface Detail {
  number: number
  outlines: number
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

/** The details of a sheet, largest first; frames and title blocks are none. */
export function detailsOf(result: PreviewResult): Detail[] {
  const { outlines, answer } = result
  const mm = mmPerUnit(answer.recipe)
  const aside = new Set([...outlines.frames, ...outlines.titleBlocks.flat()])
  const parts = new Map<number, XY[]>()
  for (let k = 0; k < outlines.count; k++) {
    if (aside.has(k)) continue
    const group = outlines.group[k]
    parts.set(group, [...(parts.get(group) ?? []), pointOf(result, k)])
  }
  const chosen = new Set((answer.recipe.part ?? []).map(([x, y]) => `${x} ${y}`))
  const details = [...parts].map(([number, part]): Detail => {
    const { minX, minY, maxX, maxY } = outlines.groups[number]
    return {
      number,
      outlines: part.length,
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

/** The detail that an outline belongs to. */
export const detailAt = (result: PreviewResult, details: readonly Detail[], outline: number) =>
  details.find(({ number }) => number === result.outlines.group[outline])

/** A point on each outline that lies wholly in the window, two opposite corners of it in drawing units. */
export function partInWindow(result: PreviewResult, [ax, ay]: XY, [bx, by]: XY): XY[] {
  const { outlines } = result
  const [minX, maxX, minY, maxY] = [Math.min(ax, bx), Math.max(ax, bx), Math.min(ay, by), Math.max(ay, by)]
  const part: XY[] = []
  for (let k = 0; k < outlines.count; k++) {
    const [x0, y0, x1, y1] = outlines.bounds.subarray(4 * k, 4 * k + 4)
    if (x0 >= minX && x1 <= maxX && y0 >= minY && y1 <= maxY) part.push(pointOf(result, k))
  }
  return part
}
