import type { BoardModel, BoardOutline, BoardStroke, StrokeLook } from '@/components/board/model'
import { boxOf, polylineOf } from '@/components/board/polyline'
import { boxOfRegion, marksOf } from '@/components/board/regionModel'
import type { Box } from '@/components/board/view'
import { mmPerUnit } from '@/lib/geometry/recipe'
import { pathOf, regionPath } from '@/lib/geometry/svgPath'
import { transformEdges } from '@/lib/geometry/transform'
import type { PreviewResult } from '@/lib/jobs/browser-pool'

const NOTHING: Box = { minX: 0, minY: 0, maxX: 100, maxY: 100 }

function around(boxes: readonly Box[]): Box {
  if (boxes.length === 0) return NOTHING
  return boxes.reduce((a, b) => ({
    minX: Math.min(a.minX, b.minX),
    minY: Math.min(a.minY, b.minY),
    maxX: Math.max(a.maxX, b.maxX),
    maxY: Math.max(a.maxY, b.maxY),
  }))
}

/** What the board draws of a preview: the metal where there is some, every outline that can be picked, chains left open. */
export function previewModel({ answer, outlines, roles, region }: PreviewResult): BoardModel {
  const { recipe } = answer
  const similarity = { scale: mmPerUnit(recipe), turn: recipe.turn }
  const edges = transformEdges(outlines.edges, similarity)
  const open = transformEdges(outlines.openEdges, similarity)
  const { loopStart, openStart } = outlines

  const polylines: Float64Array[] = []
  const boxes: Box[] = []
  for (let k = 0; k < outlines.count; k++) {
    polylines.push(polylineOf(edges, loopStart[k], loopStart[k + 1]))
    boxes.push(boxOf(polylines[k]))
  }
  const openBoxes: Box[] = []
  for (let k = 0; k + 1 < openStart.length; k++) openBoxes.push(boxOf(polylineOf(open, openStart[k], openStart[k + 1])))
  const counted = boxes.filter((_, k) => roles[k] !== 'out')
  const extents = region ? boxOfRegion(region) : around(counted.length > 0 ? counted : [...boxes, ...openBoxes])
  const origin = { x: (extents.minX + extents.maxX) / 2, y: (extents.minY + extents.maxY) / 2 }

  const paths: Record<StrokeLook, string> = { open: '', out: '', drawn: '' }
  const picked: BoardOutline[] = []
  for (let k = 0; k < outlines.count; k++) {
    const path = pathOf(edges, loopStart[k], loopStart[k + 1], true, origin)
    picked.push({ id: `o${k + 1}`, path, polyline: polylines[k], box: boxes[k] })
    if (roles[k] === 'out') paths.out += path
    else if (!region || roles[k] === null) paths.drawn += path
  }
  for (let k = 0; k + 1 < openStart.length; k++) paths.open += pathOf(open, openStart[k], openStart[k + 1], false, origin)
  const strokes: BoardStroke[] = (['out', 'drawn', 'open'] as const).flatMap((look) =>
    paths[look] ? [{ look, path: paths[look] }] : [],
  )
  return {
    extents,
    origin,
    metal: region ? regionPath(region, origin) : '',
    outer: '',
    inner: '',
    strokes,
    outlines: picked,
    marks: marksOf(answer.findings, answer),
    section: answer.section,
    region,
  }
}
