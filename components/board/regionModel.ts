import { boundsOfEdges, unionOfBoxes } from '@/lib/geometry/bounds'
import type { Finding } from '@/lib/geometry/finding'
import { mmPerUnit } from '@/lib/geometry/recipe'
import type { Region } from '@/lib/geometry/region'
import { pathOf, regionPath } from '@/lib/geometry/svgPath'
import { cosSin } from '@/lib/geometry/transform'
import type { SectionAnswer } from '@/lib/section/types'
import type { BoardMark, BoardModel, BoardOutline } from './model'
import { boxOf, distanceTo, polylineOf } from './polyline'
import { type Box, type DrawingPoint, within } from './view'

const EMPTY: Box = { minX: 0, minY: 0, maxX: 100, maxY: 100 }

/** The box of everything a region's edges reach; a square of 100 mm for nothing at all. */
export function boxOfRegion({ edges }: Region): Box {
  if (edges.count === 0) return EMPTY
  const [minX, minY, maxX, maxY] = unionOfBoxes(boundsOfEdges(edges), 0, edges.count)
  return { minX, minY, maxX, maxY }
}

/** A place in drawing units, as outlines and findings have it, in mm of the section (after the recipe's turn). */
export function placeInSection([x, y]: readonly [number, number], answer: Pick<SectionAnswer, 'recipe'>): DrawingPoint {
  const [cos, sin] = cosSin(answer.recipe.turn)
  const mm = mmPerUnit(answer.recipe)
  return { x: mm * (cos * x - sin * y), y: mm * (sin * x + cos * y) }
}

export function marksOf(findings: Finding[], answer: Pick<SectionAnswer, 'recipe'>): BoardMark[] {
  return findings.flatMap(({ at, size, severity, message }, index) =>
    at ? [{ index, severity, message, at: placeInSection(at, answer), size: (size ?? 0) * mmPerUnit(answer.recipe) }] : [],
  )
}

/** The outline of the list that a loop of the metal came from: the one whose named point lies on it. */
function idOfLoop(polyline: Float64Array, box: Box, places: { id: string; at: DrawingPoint }[]): string | null {
  const near = Math.max(box.maxX - box.minX, box.maxY - box.minY) / 200
  const found = places.find(({ at }) => within(box, at, near) && distanceTo(polyline, at) <= near)
  return found?.id ?? null
}

/** The board of a stored section: its metal, its loops by outline, its findings. */
export function regionModel(region: Region, answer: SectionAnswer): BoardModel {
  const extents = boxOfRegion(region)
  const origin = { x: (extents.minX + extents.maxX) / 2, y: (extents.minY + extents.maxY) / 2 }
  const { edges, loopStart, hole } = region
  const places = answer.outlines.map(({ id, at }) => ({ id, at: placeInSection(at, answer) }))
  const outlines: BoardOutline[] = []
  let outer = ''
  let inner = ''
  for (let k = 0; k < hole.length; k++) {
    const path = pathOf(edges, loopStart[k], loopStart[k + 1], true, origin)
    const polyline = polylineOf(edges, loopStart[k], loopStart[k + 1])
    const box = boxOf(polyline)
    outlines.push({ id: idOfLoop(polyline, box, places) ?? `loop ${k + 1}`, path, polyline, box })
    if (hole[k]) inner += path
    else outer += path
  }
  return {
    extents,
    origin,
    metal: regionPath(region, origin),
    outer,
    inner,
    strokes: [],
    outlines,
    marks: marksOf(answer.findings, answer),
    section: answer.section,
    region,
  }
}
